import { SHELL } from "@/lib/activity/append";
import { issueKey, revokeKey } from "@/lib/auth/manage-keys";
import { SCOPE_NAMES } from "@/lib/auth/scope";
import type { RefusalCode } from "@/lib/service/refusal";
import { BASE_PATH } from "../base-path";
import { dispatch } from "../dispatch";
import type { RouteTable } from "../route-table";
import { UNKNOWN_KEY } from "./collect";
import { REFUSED_CALLS, type RefusedCall, type ShownCall } from "./refused-calls";
import { SampleIds } from "./sample-ids";
import { type Scratch, scratchService } from "./scratch-service";

/** A call that was really refused, in the words of HTTP, and the answer that it got. */
export interface ShownRefusal {
  /** Calls that came before it, and then the call. */
  readonly calls: readonly string[];
  readonly status: number;
  /** The problem document, and the headers that belong to this problem. */
  readonly answer: string;
}

const LOCAL = "http://localhost";
const TOLD_HEADERS = ["Retry-After", "Allow", "WWW-Authenticate"];

/** Makes every call of `REFUSED_CALLS` on a service in memory. `origin` is where the pages of the problems are. */
export async function collectRefusals(
  routes: RouteTable,
  origin: string,
): Promise<ReadonlyMap<string, ShownRefusal>> {
  const scratch = scratchService(origin);
  try {
    const found = new Map<string, ShownRefusal>();
    for (const [code, call] of Object.entries(REFUSED_CALLS)) {
      const shown = await refuse(routes, scratch, call);
      if (shown.answer.includes(`/docs/problems/${code}"`)) found.set(code, shown);
    }
    return found;
  } finally {
    await scratch.settle();
    scratch.close();
  }
}

async function refuse(routes: RouteTable, scratch: Scratch, call: RefusedCall): Promise<ShownRefusal> {
  const key = keyFor(scratch, call);
  const ids = new SampleIds();
  const calls: string[] = [];
  let made = "";
  const send = async (each: ShownCall, credentials: RefusedCall["credentials"], shown?: string) => {
    await scratch.settle();
    const inUrl = credentials === "in-url" || credentials === "twice";
    const path = BASE_PATH + each.path.replace("$made", made) + (inUrl ? `?key=${key}` : "");
    const headers: Record<string, string> = {};
    if (credentials !== "none" && credentials !== "in-url") headers.Authorization = `Bearer ${key}`;
    if (each.body !== undefined) headers["Content-Type"] = "application/json";
    Object.assign(headers, each.headers);
    const body = typeof each.body === "object" ? JSON.stringify(each.body, null, 2) : each.body;
    const lines = Object.entries(headers).map(([name, value]) => `${name}: ${value}`);
    const text = [
      `${each.method} ${path}`,
      ...lines,
      ...(body === undefined ? [] : ["", shown ?? String(body)]),
    ];
    calls.push(ids.replace(text.join("\n")));
    const init = { method: each.method, headers, body: body === undefined ? undefined : String(body) };
    return dispatch(new Request(LOCAL + path, init), scratch.service, routes);
  };
  for (const each of call.before ?? []) {
    const answer: unknown = await (await send(each, undefined)).json();
    if (typeof answer === "object" && answer && "id" in answer) made = String(answer.id);
  }
  const response = await send(call, call.credentials, call.bodyShown);
  const told = TOLD_HEADERS.flatMap((name) => {
    const value = response.headers.get(name);
    return value === null ? [] : [`${name}: ${value}`];
  });
  const document = JSON.stringify(await response.json(), null, 2);
  return {
    calls,
    status: response.status,
    answer: ids.replace([...told, ...(told.length > 0 ? [""] : []), document].join("\n")),
  };
}

function keyFor({ service, teamId, moment }: Scratch, { key, credentials }: RefusedCall): string {
  if (credentials === "never-issued") return UNKNOWN_KEY;
  const now = moment();
  const { view, text } = issueKey(service.db, {
    teamId,
    settings: {
      name: "CAD scripts",
      scopes: [...SCOPE_NAMES],
      // Over before the next call, which is a second later.
      ...(credentials === "over" ? { expiresAt: new Date(now + 1).toISOString() } : {}),
      ...key,
    },
    actor: SHELL,
    now,
  });
  if (credentials === "revoked") revokeKey(service.db, { id: view.id, actor: SHELL, now });
  return text;
}

const COLLECTED = new WeakMap<RouteTable, Promise<ReadonlyMap<string, ShownRefusal>>>();

/** The refusal that shows a problem, made once a process; none where no call by itself brings it about. */
export async function shownRefusal(
  routes: RouteTable,
  origin: string,
  code: RefusalCode,
): Promise<ShownRefusal | undefined> {
  let collected = COLLECTED.get(routes);
  if (!collected) {
    collected = collectRefusals(routes, origin);
    COLLECTED.set(routes, collected);
    // A failure is told to those who wait for it and tried again by the next.
    collected.catch(() => COLLECTED.delete(routes));
  }
  return (await collected).get(code);
}
