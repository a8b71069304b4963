import "server-only";
import type { z } from "zod";
import { parseBody, receiveBody } from "@/api/body";
import { parseParameters } from "@/api/parameters";
import type { Database } from "@/db/client";
import { listTeams } from "@/db/queries/teams";
import type { Actor } from "@/lib/activity/append";
import { type Action, may, reachOf, requireMay, requireMayAnywhere } from "@/lib/auth/permissions";
import { personActor, type SignedIn, signedInBy } from "@/lib/auth/session";
import { refuseOtherSites, requireSamePage } from "@/lib/http/same-page";
import { minuteBucket } from "@/lib/limits/quota";
import { Refusal } from "@/lib/service/refusal";
import { answerPageCall, type PageCall } from "../../_server/page-call";

/** Calls a minute that one person's pages may make. */
const PERSON_MINUTE_QUOTA = 1_200;

/** What a handler of the console knows of a call. */
export interface ConsoleCall<Body, Query> extends PageCall {
  readonly db: Database;
  readonly person: SignedIn;
  /** The person, as the activity names them. */
  readonly actor: Actor;
  /** Parts of the path. */
  readonly params: Readonly<Record<string, string>>;
  readonly query: Query;
  readonly body: Body;
  /** Ids of the teams that the route's action reaches: of these a list may tell. */
  readonly teamIds: readonly string[];
  /** Whether the person may do something to what belongs to a team. */
  readonly may: (action: Action, teamId: string | null) => boolean;
  /** Refuses what the person may not do to a team's things: 404 for another team's, 403 for the own one's. */
  readonly requireTeam: (teamId: string | null, action?: Action) => void;
}

interface ConsoleSpec<Body extends z.ZodType, Query extends z.ZodObject> {
  /** What the call does; a role that never may is refused with 403 before anything is read. */
  readonly action: Action;
  readonly body?: Body;
  readonly query?: Query;
  /** Largest body, bytes; 1 MB where left out. */
  readonly maxBytes?: number;
  /** Returns what is answered as JSON, `undefined` for 204, or a `PageAnswer`. Throws Refusals. */
  readonly handle: (call: ConsoleCall<z.infer<Body>, z.infer<Query>>) => unknown;
}

interface Context {
  readonly params: Promise<Record<string, string | string[] | undefined>>;
}

/**
 * One method of a route behind the console: the session first (401 before any body is read), then the same origin, the
 * role, the input, the work. Lists ask `teamIds`; whatever has an id asks `requireTeam`.
 */
export function consoleRoute<
  Body extends z.ZodType = z.ZodUndefined,
  Query extends z.ZodObject = z.ZodObject<Record<never, never>>,
>(spec: ConsoleSpec<Body, Query>): (request: Request, context: Context) => Promise<Response> {
  return (request, context) =>
    answerPageCall(request, async (call, limits) => {
      const { service, headers } = call;
      const person = await signedInBy(service, headers.get("cookie"), call.address);
      if (!person) throw new Refusal("sign-in-required", "Sign in first.");
      const reads = request.method === "GET" || request.method === "HEAD";
      if (reads) refuseOtherSites(headers);
      else requireSamePage(headers, service.config.origin);
      const spending = await service.limiter.spend(
        minuteBucket(`person:${person.personId}`, PERSON_MINUTE_QUOTA),
      );
      limits.push(spending);
      if (!spending.allowed) {
        throw new Refusal("too-many-requests", "Too many calls in this minute.", {
          headers: { "Retry-After": String(spending.resetSeconds) },
        });
      }
      requireMayAnywhere(person, spec.action);
      const query = parseParameters(spec.query, call.url.searchParams) as z.infer<Query>;
      const body = await readBody(request, call, spec);
      return await spec.handle({
        ...call,
        db: service.db,
        person,
        actor: personActor(person, call.address, call.requestId),
        params: await plainParams(context),
        query,
        body,
        teamIds:
          reachOf(person.role, spec.action) === "all"
            ? listTeams(service.db).map(({ id }) => id)
            : person.teamIds,
        may: (action, teamId) => may(person, action, teamId),
        requireTeam: (teamId, action = spec.action) => requireMay(person, action, teamId),
      });
    });
}

async function readBody<Body extends z.ZodType>(
  request: Request,
  call: PageCall,
  spec: { readonly body?: Body; readonly maxBytes?: number },
): Promise<z.infer<Body>> {
  if (!spec.body) return undefined as z.infer<Body>;
  const readers = { description: "The change.", schema: spec.body, maxBytes: spec.maxBytes };
  return parseBody(readers, await receiveBody(request, readers), call.url.searchParams);
}

async function plainParams(context: Context): Promise<Record<string, string>> {
  // Next gives none where the path has no variable part.
  const given: Awaited<Context["params"]> | undefined = await context.params;
  return Object.fromEntries(
    Object.entries(given ?? {}).map(([name, value]) => [
      name,
      Array.isArray(value) ? value.join("/") : (value ?? ""),
    ]),
  );
}
