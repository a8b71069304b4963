import { type Database, transact } from "./client";

interface Job {
  /** Runs in a savepoint of its own; says how to tell the caller once the group is committed. */
  readonly run: () => () => void;
  readonly fail: (error: unknown) => void;
}

/**
 * Writes of calls that end at about the same time, in one transaction: what a commit costs is shared. Each caller waits
 * until its write is committed, so an answer that went out is in the database, whatever happens next.
 */
export class GroupCommit {
  private static readonly groups = new WeakMap<Database, GroupCommit>();

  private jobs: Job[] = [];

  constructor(private readonly db: Database) {}

  /** The one that everybody who writes to a database shares. */
  static of(db: Database): GroupCommit {
    let group = GroupCommit.groups.get(db);
    if (!group) GroupCommit.groups.set(db, (group = new GroupCommit(db)));
    return group;
  }

  /**
   * Runs `work` (synchronous) in the next group. If it throws, only its own writes are rolled back and the promise
   * rejects with what was thrown.
   */
  run<Result>(work: () => Result): Promise<Result> {
    return new Promise<Result>((resolve, reject) => {
      const run = () => {
        try {
          const result = transact(this.db, work);
          return () => resolve(result);
        } catch (error) {
          return () => reject(error);
        }
      };
      this.jobs.push({ run, fail: reject });
      if (this.jobs.length === 1) setImmediate(() => this.flush());
    });
  }

  private flush(): void {
    const jobs = this.jobs;
    this.jobs = [];
    try {
      const settle = transact(this.db, () => jobs.map(({ run }) => run()));
      for (const tell of settle) tell();
    } catch (error) {
      // The lock was not to be had or the commit failed: nothing of the group is stored.
      for (const { fail } of jobs) fail(error);
    }
  }
}
