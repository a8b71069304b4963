import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { type Database, migrateDatabase, openDatabase } from "@/db/client";
import { insertTeam } from "@/db/queries/teams";
import { SHELL } from "@/lib/activity/append";
import { issueKey } from "@/lib/auth/manage-keys";
import { SCOPE_NAMES } from "@/lib/auth/scope";
import { readConfig } from "@/lib/config/environment";
import { type Bucket, type BucketState, Limiter, type Spending } from "@/lib/limits/limiter";
import { InlineRunner } from "@/lib/jobs/worker-pool";
import { openLog } from "@/lib/service/log";
import { assembleService, closeService, type Service } from "@/lib/service/service";

export interface Scratch {
  readonly service: Service;
  readonly teamId: string;
  /** The time there, ms. */
  readonly moment: () => number;
  /** A key with every scope. */
  readonly key: string;
  /** Waits until no field solution is at work, and moves the clock on: call it before each call. */
  readonly settle: () => Promise<void>;
  readonly close: () => void;
}

/** A Monday noon: dates in examples never change. */
const MOMENT = Date.UTC(2026, 2, 2, 12);

/** Counts as usual, but every window looks as if it had just begun: examples do not depend on how long they take. */
class SteadyLimiter extends Limiter {
  constructor(
    db: Database,
    private readonly clock: () => number,
  ) {
    super(db);
  }

  override async spend(bucket: Bucket, points?: number): Promise<Spending> {
    const spending = await super.spend(bucket, points);
    const { endsAt, windowSeconds } = bucket;
    const resetSeconds = endsAt === undefined ? windowSeconds : Math.ceil((endsAt - this.clock()) / 1000);
    return { ...spending, resetSeconds };
  }

  override async look(bucket: Bucket): Promise<BucketState> {
    const state = await super.look(bucket);
    return { ...state, resetSeconds: bucket.windowSeconds };
  }
}

/** A service in memory with one team and one key, on which the document's examples are computed. */
export function scratchService(origin: string): Scratch {
  const db = openDatabase(":memory:");
  migrateDatabase(db);
  // Maps of field solutions are files.
  const folder = mkdtempSync(join(tmpdir(), "rhoform-examples-"));
  const config = readConfig({
    RHOFORM_DATA: folder,
    RHOFORM_ORIGIN: origin,
    RHOFORM_SECRET: "a secret of no consequence",
    RHOFORM_LOG: "off",
  });
  // One second a call, so that lists have an order.
  let now = MOMENT;
  const service = assembleService(config, db, openLog("off"), () => now, {
    limiter: new SteadyLimiter(db, () => now),
    runner: new InlineRunner(),
  });
  const teamId = "team_0000000000000000";
  insertTeam(db, { id: teamId, slug: "busbar", name: "Busbar", createdAt: MOMENT });
  const { text } = issueKey(db, {
    teamId,
    settings: {
      name: "Design automation",
      scopes: [...SCOPE_NAMES],
      quotas: { minute: 100_000, month: 1_000_000 },
    },
    actor: SHELL,
    now: MOMENT,
  });
  const settle = async () => {
    while (service.fields.busy) await new Promise((resolve) => setImmediate(resolve));
    now += 1000;
  };
  const close = () => {
    closeService(service);
    rmSync(folder, { recursive: true, force: true });
  };
  return { service, teamId, moment: () => now, key: text, settle, close };
}
