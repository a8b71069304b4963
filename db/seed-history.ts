import type { Actor } from "@/lib/activity/append";
import type { KeySettings } from "@/lib/auth/key-settings";
import { issueKey, revokeKey } from "@/lib/auth/manage-keys";
import { computeResistance, exampleRequest, findShape } from "@/lib/engine";
import type { NewMaterial } from "@/lib/materials/input";
import {
  changeMaterial,
  createMaterial,
  retireMaterial,
  usableMaterial,
} from "@/lib/materials/team-materials";
import { storeRecord } from "@/lib/records/records";
import { newId } from "@/lib/service/identifier";
import type { Database } from "./client";
import { insertUsage } from "./queries/usage";
import type { Team } from "./queries/teams";
import { rateLimits } from "./schema/journal";

const HOUR_MS = 3_600_000;
const DAY_MS = 24 * HOUR_MS;
/** How far back the invented usage goes, days. */
const DAYS = 35;

/** A key of the demo with the calls that it is said to have made. */
interface DemoKey {
  readonly name: string;
  readonly settings?: Partial<KeySettings>;
  /** Calls of an ordinary working day. */
  readonly calls: number;
  /** Whether it also calls at night and on Sundays. */
  readonly always?: boolean;
  readonly client: string;
  readonly operations: readonly string[];
  readonly shapes: readonly string[];
  /** Share of calls that are refused. */
  readonly refused: number;
  /** Latency in the middle, ms. */
  readonly latencyMs: number;
  readonly computations?: number;
  /** Day on which it was revoked, counted back from today. */
  readonly revokedDaysAgo?: number;
  /** Ends this many days from now. */
  readonly endsInDays?: number;
  /** Share of its month that is spent: its quota follows from its calls. */
  readonly monthShare?: number;
}

/** Operations that compute a shape each call names. */
const SHAPED: ReadonlySet<string> = new Set([
  "computeResistance",
  "computeBatch",
  "readResistance",
  "sizeDimension",
]);

const KEYS: Readonly<Record<string, readonly DemoKey[]>> = {
  busbar: [
    {
      name: "CAD scripts (demo)",
      calls: 60,
      client: "python-client",
      operations: ["computeResistance", "computeResistance", "computeBatch", "listMaterials"],
      shapes: ["bar", "bar", "tapered-strip", "arc-bar"],
      refused: 0.04,
      latencyMs: 3,
      computations: 12,
    },
    {
      name: "Quotation sheets (demo)",
      settings: { allowedInUrl: true, quotas: { minute: 120, month: 2_000 } },
      calls: 30,
      client: "spreadsheet",
      operations: ["readResistance"],
      shapes: ["bar", "cylindrical-shell"],
      refused: 0.11,
      latencyMs: 2,
      monthShare: 0.87,
    },
    {
      name: "Old test bench (demo)",
      calls: 12,
      always: true,
      client: "dotnet",
      operations: ["computeResistance"],
      shapes: ["bar"],
      refused: 0.02,
      latencyMs: 4,
      revokedDaysAgo: 9,
    },
  ],
  "thin-film": [
    {
      name: "Layout checker (demo)",
      settings: { scopes: ["compute", "field", "materials:read"] },
      calls: 35,
      always: true,
      client: "typescript-client",
      operations: ["solveField", "readField", "computeResistance"],
      shapes: ["sheet-meander", "sheet-bend", "sheet-strip"],
      refused: 0.06,
      latencyMs: 240,
      computations: 3,
    },
    {
      name: "Intranet page (demo)",
      settings: { origins: ["https://intranet.merrow-pike.example"] },
      calls: 14,
      client: "browser",
      operations: ["computeResistance"],
      shapes: ["sheet-strip", "sheet-meander"],
      refused: 0.15,
      latencyMs: 3,
      endsInDays: 10,
    },
  ],
  earthing: [
    {
      name: "Site surveys (demo)",
      calls: 9,
      client: "command-line",
      operations: ["computeResistance", "sizeDimension"],
      shapes: ["earth-rod", "earth-rod-layered"],
      refused: 0.08,
      latencyMs: 5,
    },
  ],
};

const BRONZE: NewMaterial = {
  name: "Contact bronze, lot 7 (demo)",
  kind: "alloy",
  resistivity: { model: "linear", resistivity: 9.5e-8, coefficient: 0.0011, reference: 20 },
  range: { from: -40, to: 150 },
  uncertainty: { lower: 0.98, upper: 1.02, note: "Invented for the demo." },
  source: "Invented for the demo",
  provenance: "measured",
};

/** Something that is said to have happened, at a moment (Unix ms). */
export interface PastStep {
  readonly at: number;
  readonly run: () => void;
}

/** How long before now the history begins, ms. */
export const HISTORY_MS = (DAYS + 3) * DAY_MS;

/**
 * Some weeks of invented history for a team of the demo: keys, calls, materials and records, marked as demo. The calls
 * are drawn by a generator with a fixed seed and go through the same tables as real ones. The steps of all teams are to
 * be run in the order of their time, in one transaction.
 */
export function historyOf(db: Database, team: Team, actor: Actor, now: number): PastStep[] {
  const random = generator(team.slug.length * 7919 + 17);
  return [
    ...(KEYS[team.slug] ?? []).flatMap((demo) => stepsOfKey(db, team, demo, actor, now, random)),
    ...(team.slug === "busbar" ? stepsOfMaterials(db, team, actor, now) : []),
  ];
}

function stepsOfKey(
  db: Database,
  team: Team,
  demo: DemoKey,
  actor: Actor,
  now: number,
  random: () => number,
): PastStep[] {
  const issuedAt = now - HISTORY_MS;
  let keyId = "";
  const steps: PastStep[] = [];
  const pick = (from: readonly string[]) => from[Math.floor(random() * from.length)];
  const last = now - (demo.revokedDaysAgo ?? 0) * DAY_MS;
  const today = new Date(now);
  const monthStart = Date.UTC(today.getUTCFullYear(), today.getUTCMonth(), 1);
  let used = 0;
  for (let day = DAYS; day >= 0; day--) {
    const weekday = new Date(now - day * DAY_MS).getUTCDay();
    const working = weekday !== 0 && weekday !== 6;
    const calls = Math.round(demo.calls * (working ? 0.7 + 0.6 * random() : demo.always ? 0.5 : 0.04));
    const midnight = (Math.floor(now / DAY_MS) - day) * DAY_MS;
    const times = Array.from({ length: calls }, () => {
      const hour = demo.always ? 24 * random() : 6 + 5 * (random() + random());
      return Math.floor(midnight + hour * HOUR_MS);
    });
    for (const at of times.filter((time) => time < last).sort((a, b) => a - b)) {
      const refused = random() < demo.refused;
      const operation = pick(demo.operations);
      const shaped = SHAPED.has(operation);
      // Latencies of services spread by factors: log-normal, the wider the slower.
      const spread = Math.sqrt(-2 * Math.log(1 - random())) * Math.cos(2 * Math.PI * random());
      const computations = refused || !shaped ? 0 : 1 + Math.floor(random() * (demo.computations ?? 1));
      if (at >= monthStart) used += computations;
      const call = {
        at,
        requestId: newId("req"),
        teamId: team.id,
        operation,
        shape: shaped && !refused ? pick(demo.shapes) : null,
        status: refused ? (random() < 0.8 ? 422 : 429) : 200,
        latencyUs: Math.round(1000 * demo.latencyMs * Math.exp(0.7 * spread)),
        computations,
        client: demo.client,
      };
      steps.push({ at, run: () => insertUsage(db, { ...call, keyId }) });
    }
  }
  const issue: PastStep = {
    at: issuedAt,
    run: () => {
      keyId = issueKey(db, { teamId: team.id, settings: settingsOf(demo, used, now), actor, now: issuedAt })
        .view.id;
      if (used > 0) spendMonth(db, keyId, used, now);
    },
  };
  const revoke: PastStep = { at: last, run: () => revokeKey(db, { id: keyId, actor, now: last }) };
  return [issue, ...steps, ...(demo.revokedDaysAgo === undefined ? [] : [revoke])];
}

/** A demo key's settings; where a share of its month is to be spent, the quota follows from the computations used. */
function settingsOf(
  { name, settings, endsInDays, monthShare }: DemoKey,
  used: number,
  now: number,
): KeySettings {
  return {
    name,
    scopes: ["compute", "materials:read"],
    ...settings,
    ...(used > 0 && monthShare !== undefined
      ? { quotas: { ...settings?.quotas, month: Math.ceil(used / monthShare) } }
      : {}),
    ...(endsInDays === undefined ? {} : { expiresAt: new Date(now + endsInDays * DAY_MS).toISOString() }),
  };
}

/** Sets a key's counter of the month, as the limiter keeps it. */
function spendMonth(db: Database, keyId: string, points: number, now: number): void {
  const date = new Date(now);
  const key = `month:key:${keyId}:${date.toISOString().slice(0, 7)}`;
  const expire = Date.UTC(date.getUTCFullYear(), date.getUTCMonth() + 1, 2);
  db.insert(rateLimits)
    .values({ key, points, expire })
    .onConflictDoUpdate({ target: rateLimits.key, set: { points } })
    .run();
}

function stepsOfMaterials(db: Database, team: Team, actor: Actor, now: number): PastStep[] {
  type Write = Parameters<typeof createMaterial>[1];
  const step = (daysAgo: number, run: (write: Write) => void): PastStep => {
    const at = now - daysAgo * DAY_MS;
    return { at, run: () => run({ teamId: team.id, actor, now: at }) };
  };
  let bronze = "";
  let old = "";
  const record = (write: Write, label: string) => {
    const shape = findShape("bar");
    if (!shape) throw new Error("The demo computes the shape bar, which the catalogue lacks.");
    const request = {
      ...exampleRequest(shape),
      medium: { material: bronze },
      include: ["steps", "checks"],
    };
    const result = computeResistance(request, { material: (id) => usableMaterial(db, team.id, id) });
    storeRecord(db, write, {
      operation: "resistance",
      label,
      shape: shape.id,
      request,
      result,
      materials: result.materials,
    });
  };
  return [
    step(33, (write) => {
      old = createMaterial(db, write, { ...BRONZE, name: "Contact bronze, lot 5 (demo)" }).id;
    }),
    step(30, (write) => {
      retireMaterial(db, write, old, 1);
      bronze = createMaterial(db, write, BRONZE).id;
    }),
    step(28, (write) => record(write, "Spring contact, first lot (demo)")),
    step(16, (write) =>
      changeMaterial(db, write, bronze, 1, {
        resistivity: { model: "linear", resistivity: 9.32e-8, coefficient: 0.00114, reference: 20 },
        uncertainty: { lower: 0.99, upper: 1.01, note: "Invented for the demo: measured again." },
      }),
    ),
    step(12, (write) => record(write, "Spring contact, second lot (demo)")),
  ];
}

/** Numbers from 0 to 1, the same for the same seed (mulberry32, public domain; from memory). */
function generator(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
  };
}
