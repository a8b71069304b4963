import { RateLimiterRes, RateLimiterSQLite } from "rate-limiter-flexible";
import type { Database } from "@/db/client";
import { GroupCommit } from "@/db/group-commit";
import { forgetExpired } from "@/db/queries/rate-limits";

/** A counter with a quota: who spends from it, how much there is, for how long. */
export interface Bucket {
  readonly policy: "minute" | "month" | "address" | "sign-in";
  readonly subject: string;
  readonly quota: number;
  /** How long a window lasts from its first spending, s. */
  readonly windowSeconds: number;
  /** End of the window where the calendar sets it, Unix ms. */
  readonly endsAt?: number;
}

export interface BucketState {
  readonly bucket: Bucket;
  readonly remaining: number;
  /** Seconds until the quota is whole again, rounded up. */
  readonly resetSeconds: number;
}

export interface Spending extends BucketState {
  readonly allowed: boolean;
}

/** Counters whose window is over are removed once in so many spendings. */
const SWEEP_EVERY = 5_000;

/**
 * Counts on the table of the database, so that processes share the counts and a restart forgets nothing. Each spending
 * is one atomic statement: of any number of calls at once exactly the quota is allowed.
 */
export class Limiter {
  private readonly limiters = new Map<string, RateLimiterSQLite>();
  private spendings = 0;

  private readonly store: object;

  constructor(private readonly db: Database) {
    this.store = storeOf(db);
  }

  /** One limiter a policy and quota; rate-limiter-flexible fixes the quota at construction. */
  private limiterOf(bucket: Bucket): RateLimiterSQLite {
    const name = `${bucket.policy}/${bucket.quota}`;
    let limiter = this.limiters.get(name);
    if (!limiter) {
      limiter = new RateLimiterSQLite({
        storeClient: this.store,
        storeType: "better-sqlite3",
        tableName: "rate_limits",
        tableCreated: true,
        keyPrefix: bucket.policy,
        points: bucket.quota,
        duration: 60,
        // A refused call is remembered without the database; what a month or a sign-in gives back is not.
        inMemoryBlockOnConsumed: bucket.policy === "month" || bucket.policy === "sign-in" ? 0 : bucket.quota,
      });
      this.limiters.set(name, limiter);
    }
    return limiter;
  }

  /** Spends points, or nothing where fewer are left. */
  async spend(bucket: Bucket, points = 1): Promise<Spending> {
    // Now and then, and not by a timer: nothing may run after the database is closed.
    if (this.spendings++ % SWEEP_EVERY === 0) forgetExpired(this.db, Date.now());
    const limiter = this.limiterOf(bucket);
    const options = { customDuration: bucket.windowSeconds };
    try {
      const result = await limiter.consume(bucket.subject, points, options);
      return { ...stateOf(bucket, result.remainingPoints, result.msBeforeNext), allowed: true };
    } catch (refused) {
      if (!(refused instanceof RateLimiterRes)) throw refused;
      if (bucket.policy !== "month") return { ...stateOf(bucket, 0, refused.msBeforeNext), allowed: false };
      const left = await limiter.reward(bucket.subject, points, options);
      return { ...stateOf(bucket, bucket.quota - left.consumedPoints, left.msBeforeNext), allowed: false };
    }
  }

  /** Returns points that were reserved and not needed. */
  async giveBack(bucket: Bucket, points: number): Promise<BucketState> {
    const options = { customDuration: bucket.windowSeconds };
    const result = await this.limiterOf(bucket).reward(bucket.subject, points, options);
    return stateOf(bucket, bucket.quota - result.consumedPoints, result.msBeforeNext);
  }

  /** What is left, without spending. */
  async look(bucket: Bucket): Promise<BucketState> {
    const result = await this.limiterOf(bucket).get(bucket.subject);
    if (!result) return stateOf(bucket, bucket.quota, bucket.windowSeconds * 1000);
    return stateOf(bucket, bucket.quota - result.consumedPoints, result.msBeforeNext);
  }
}

/**
 * The database as the limiter uses it, with what costs most shared: every statement is prepared once, and spendings of
 * calls that come at about the same time are committed together (the limiter waits for what a transaction returns).
 */
function storeOf(db: Database): object {
  const { $client } = db;
  const commits = GroupCommit.of(db);
  const statements = new Map<string, ReturnType<typeof $client.prepare>>();
  return {
    prepare: (text: string) => {
      let statement = statements.get(text);
      if (!statement) statements.set(text, (statement = $client.prepare(text)));
      return statement;
    },
    transaction:
      <Result>(work: () => Result) =>
      () =>
        commits.run(work),
  };
}

function stateOf(bucket: Bucket, remaining: number, msBeforeNext: number): BucketState {
  const ms = bucket.endsAt === undefined ? msBeforeNext : bucket.endsAt - Date.now();
  return {
    bucket,
    remaining: Math.min(bucket.quota, Math.max(0, remaining)),
    resetSeconds: Math.max(1, Math.ceil(ms / 1000)),
  };
}
