import { createHmac } from "node:crypto";
import { SHELL } from "@/lib/activity/append";
import { demoPassword, demoSecret, formatKey } from "@/lib/auth/key-text";
import { issueKey } from "@/lib/auth/manage-keys";
import { hashPasswordNow, passwordMatchesNow } from "@/lib/auth/password";
import { computeResistance, exampleRequest, findShape, libraryMaterial } from "@/lib/engine";
import { DEFAULT_EMBED_QUOTA } from "@/lib/embeds/definition";
import { DEMO_EMBED, demoEmbedId } from "@/lib/embeds/demo";
import { createEmbed, publishEmbed } from "@/lib/embeds/manage-embeds";
import { storeRecord } from "@/lib/records/records";
import { bytesToText, newId } from "@/lib/service/identifier";
import type { Service } from "@/lib/service/service";
import { type Database, transact } from "./client";
import { embedById } from "./queries/embeds";
import { keyById } from "./queries/keys";
import { personByEmail, updatePerson } from "./queries/people";
import { readSetting, writeSetting } from "./queries/settings";
import { insertMembership, insertPerson, insertTeam, type Team, teamBySlug } from "./queries/teams";
import type { Role } from "./schema/organisation";
import { HISTORY_MS, historyOf } from "./seed-history";

interface DemoTeam {
  readonly slug: string;
  readonly name: string;
  readonly people: readonly { readonly name: string; readonly email: string; readonly role: Role }[];
  /** What the team has computed: the label and the shape whose worked example it is. */
  readonly records: readonly (readonly [string, string])[];
}

/** The fictional maker of switchgear and sensors of the demo. */
const COMPANY = "Merrow Pike";

const TEAMS: readonly DemoTeam[] = [
  {
    slug: "busbar",
    name: "Busbar",
    people: [
      { name: "Ines Harrow", email: "ines.harrow@merrow-pike.example", role: "admin" },
      { name: "Tomas Vell", email: "tomas.vell@merrow-pike.example", role: "developer" },
    ],
    records: [
      ["Main bar, panel 2", "bar"],
      ["Insulating sleeve, rev C", "cylindrical-shell"],
      ["Tapered link to the breaker", "tapered-strip"],
    ],
  },
  {
    slug: "thin-film",
    name: "Thin film",
    people: [
      { name: "Maud Okerlund", email: "maud.okerlund@merrow-pike.example", role: "developer" },
      { name: "Jori Banfield", email: "jori.banfield@merrow-pike.example", role: "viewer" },
    ],
    records: [
      ["Heater track, sensor 4", "sheet-meander"],
      ["Corner of the guard ring", "sheet-bend"],
    ],
  },
  {
    slug: "earthing",
    name: "Earthing",
    people: [
      { name: "Petra Lindqvist-Shaw", email: "petra.lindqvist-shaw@merrow-pike.example", role: "developer" },
    ],
    records: [["Rod at the north gate", "earth-rod"]],
  },
];

/** Whom the printed demo sign-in is for: the demo's administrator. */
const DEMO_EMAIL = TEAMS[0].people[0].email;

/** Scopes of the demo keys: everything but the management of keys. */
const DEMO_SCOPES = ["compute", "field", "materials:read", "materials:write", "records:read"] as const;

/** Id of a team's demo key, different in every installation. */
function demoKeyId(serviceSecret: string, slug: string): string {
  const digest = createHmac("sha256", serviceSecret).update(`rhoform demo key id ${slug}`).digest();
  return `k${bytesToText(digest).slice(-15)}`;
}

/** A team's demo key, derived again; undefined where there is none, or it was revoked. */
export function demoKey({ db, config }: Service, slug = "busbar"): string | undefined {
  const id = demoKeyId(config.secret, slug);
  const row = keyById(db, id);
  return row && row.revokedAt === null ? formatKey({ id, secret: demoSecret(config.secret, id) }) : undefined;
}

/** The demo sign-in; undefined where the administrator was removed or has another password. */
export function demoSignIn({ db, config }: Service): { email: string; password: string } | undefined {
  const person = personByEmail(db, DEMO_EMAIL);
  const password = demoPassword(config.secret);
  if (!person || person.removedAt !== null || !passwordMatchesNow(password, person.passwordHash))
    return undefined;
  return { email: DEMO_EMAIL, password };
}

/**
 * Fills an installation with the demo company: teams, people, a key a team, and records that are computed here and now
 * by the engine. What is there already stays as it is.
 */
export function seedDemo(service: Service): void {
  const { db, config, now } = service;
  transact(db, () => {
    if (readSetting(db, "organisation") === undefined)
      writeSetting(db, "organisation", { name: COMPANY }, now());
    const startedAt = now();
    const fresh = TEAMS.filter(({ slug }) => !teamBySlug(db, slug)).map((demo) => ({
      demo,
      team: seedTeam(db, demo, startedAt - HISTORY_MS),
    }));
    const actor = { ...SHELL, name: "Demo" };
    const steps = fresh.flatMap(({ team }) => historyOf(db, team, actor, startedAt));
    // What is appended stands in the order of time, whichever team did it.
    for (const { run } of steps.sort((a, b) => a.at - b.at)) run();
    for (const { slug } of TEAMS) {
      const team = teamBySlug(db, slug);
      if (!team) continue;
      seedKey(service, team);
      if (slug === "busbar") seedEmbed(service, team);
    }
    for (const { demo, team } of fresh) seedRecords(service, team, demo.records);
    const first = personByEmail(db, DEMO_EMAIL);
    if (first && first.passwordHash === null) {
      updatePerson(db, first.id, { passwordHash: hashPasswordNow(demoPassword(config.secret)) });
    }
  });
}

function seedTeam(db: Database, demo: DemoTeam, createdAt: number): Team {
  const team = { id: newId("team"), slug: demo.slug, name: demo.name, createdAt };
  insertTeam(db, team);
  for (const person of demo.people) {
    const id = newId("per");
    insertPerson(db, { id, ...person, createdAt });
    insertMembership(db, id, team.id, createdAt);
  }
  return team;
}

function seedKey({ db, config, now }: Service, team: Team): void {
  const id = demoKeyId(config.secret, team.slug);
  if (keyById(db, id)) return;
  issueKey(db, {
    teamId: team.id,
    settings: { name: "Demo", scopes: [...DEMO_SCOPES] },
    actor: SHELL,
    now: now(),
    fixed: { id, secret: demoSecret(config.secret, id) },
  });
}

function seedEmbed({ db, config, now }: Service, team: Team): void {
  const id = demoEmbedId(config.secret);
  if (embedById(db, id)) return;
  const by = { actor: { ...SHELL, name: "Demo" }, now: now() };
  createEmbed(db, by, {
    id,
    teamId: team.id,
    settings: { name: "Busbar section", origins: [], monthQuota: DEFAULT_EMBED_QUOTA },
    definition: DEMO_EMBED,
  });
  publishEmbed(db, by, id);
}

function seedRecords({ db, config, now }: Service, team: Team, records: DemoTeam["records"]): void {
  const actor = { ...SHELL, kind: "key" as const, id: demoKeyId(config.secret, team.slug), name: "Demo" };
  for (const [label, shapeId] of records) {
    const shape = findShape(shapeId);
    if (!shape) throw new Error(`The demo computes the shape ${shapeId}, which the catalogue lacks.`);
    const request = { ...exampleRequest(shape), include: ["steps", "profile", "checks", "peak"] };
    const result = computeResistance(request, { material: libraryMaterial });
    storeRecord(
      db,
      { teamId: team.id, actor, now: now() },
      { operation: "resistance", label, shape: shape.id, request, result, materials: result.materials },
    );
  }
}
