import { transact, type Database } from "@/db/client";
import {
  claimOpenFields,
  countOpenFields,
  extendClaims,
  fieldById,
  type FieldProgress,
  type FieldRow,
  insertField,
  type NewField,
  releaseClaims,
  updateOpenField,
} from "@/db/queries/fields";
import { addEmbedComputations } from "@/db/queries/embeds";
import { addComputations } from "@/db/queries/usage";
import { CheckFailure, type Material, prepareField } from "@/lib/engine";
import type { Limiter } from "../limits/limiter";
import { monthBucket } from "../limits/quota";
import { storeRecord } from "../records/records";
import { newId } from "../service/identifier";
import type { Log } from "../service/log";
import { fieldCost, MOST_UNKNOWNS, SIGNED_OUT_UNKNOWNS } from "./field-cost";
import { FieldFiles } from "./field-files";
import type { FieldOutcome } from "./field-task";
import { WARMING_BEND, WARMING_PLATE } from "./warming-body";
import type { PoolTask, RunningTask, TaskRunner } from "./worker-pool";

/** How long a claim holds without being extended, and how often it is, ms. */
const CLAIM_MS = 20_000;
const BEAT_MS = 5_000;
/** Progress goes to the database at most so often, ms; listeners of this process get all of it. */
const KEEP_EVERY_MS = 300;

/** How long a start waits for warm threads at most, ms. */
const PATIENCE_MS = 15_000;
/** How often this thread reads a small request at the start, until the code that checks outlines is compiled. */
const WARM_READINGS = 40;

/** Most solutions that may wait or run, for one owner and for all. */
export const MOST_OPEN_OF_OWNER = 200;
export const MOST_OPEN = 2_000;

export interface FieldJobsOptions {
  readonly db: Database;
  readonly limiter: Limiter;
  readonly log: Log;
  readonly folder: string;
  readonly runner: TaskRunner;
  readonly secondsAllowed: number;
  readonly now: () => number;
}

type Listener = (row: FieldRow) => void;

/**
 * Field solutions of this process: a queue in the database, worked off by a pool of threads, small ones first. What a
 * process leaves behind, another one (or the next) takes over when its claim has run out.
 */
export class FieldJobs {
  readonly files: FieldFiles;
  private readonly process = newId("fld");
  private readonly waiting: FieldRow[] = [];
  private readonly running = new Map<string, RunningTask>();
  private readonly listeners = new Map<string, Set<Listener>>();
  private readonly closers = new Set<() => void>();
  private beat: NodeJS.Timeout | undefined;
  private closing = false;

  constructor(private readonly options: FieldJobsOptions) {
    this.files = new FieldFiles(options.folder);
  }

  /** Takes over what was left behind and warms up; resolves when the first caller is answered as fast as later ones. */
  async open(): Promise<void> {
    // First, so that no job that was left behind comes before it in the threads' queue.
    const ready = this.options.runner.start();
    this.beat = setInterval(() => this.tend(), BEAT_MS);
    this.beat.unref();
    this.tend();
    for (let k = 0; k < WARM_READINGS; k++) {
      for (const body of [WARMING_BEND, WARMING_PLATE]) {
        prepareField(body, { material: () => undefined, outline: () => undefined });
      }
    }
    try {
      await Promise.race([ready, new Promise((resolve) => setTimeout(resolve, PATIENCE_MS).unref())]);
    } catch (error) {
      // Whoever comes next is told; the service itself goes on without field solutions.
      if (!this.closing) this.options.log.error({ event: "field-threads", error: describe(error) });
    }
  }

  /** Keeps this process's claims and takes over those of processes that are gone. */
  private tend(): void {
    if (this.closing) return;
    const { db, now } = this.options;
    extendClaims(db, this.process, now() + CLAIM_MS);
    for (const row of claimOpenFields(db, this.process, now(), now() + CLAIM_MS)) this.enqueue(row);
    this.pump();
  }

  /** Stores a new solution; call it in the transaction of the call, and `start` after it. */
  insert(row: Omit<NewField, "claimedBy" | "claimedUntil" | "status">): void {
    insertField(this.options.db, {
      ...row,
      status: "queued",
      claimedBy: this.process,
      claimedUntil: this.options.now() + CLAIM_MS,
    });
  }

  /** Begins work on a stored solution. */
  start(id: string): void {
    this.beat ??= setInterval(() => this.tend(), BEAT_MS).unref();
    const row = fieldById(this.options.db, id);
    if (row) this.enqueue(row);
    this.pump();
  }

  private enqueue(row: FieldRow): void {
    const at = this.waiting.findIndex(({ size }) => size > row.size);
    this.waiting.splice(at < 0 ? this.waiting.length : at, 0, row);
  }

  private pump(): void {
    while (!this.closing && this.running.size < this.options.runner.threads) {
      const row = this.waiting.shift();
      if (!row) return;
      this.begin(row);
    }
  }

  private begin(row: FieldRow): void {
    const { db, log, now, secondsAllowed } = this.options;
    if (!updateOpenField(db, row.id, { status: "running" })) return;
    this.tell(row.id);
    let kept = 0;
    const task = this.options.runner.run({
      body: JSON.parse(row.request),
      // Written by this application only, from materials that had passed their schema.
      materials: row.materials as Material[],
      secondsAllowed,
      maximumUnknowns: row.charge.teamId === "" ? SIGNED_OUT_UNKNOWNS : MOST_UNKNOWNS,
      onProgress: (progress) => {
        if (this.closing || now() - kept < KEEP_EVERY_MS) return this.tellProgress(row.id, progress);
        kept = now();
        updateOpenField(db, row.id, { progress });
        this.tell(row.id);
      },
    });
    this.running.set(row.id, task);
    const end = (outcome: FieldOutcome | { kind: "broken"; error: unknown }) => this.finish(row, outcome);
    task.outcome
      .then(end, (error: unknown) => end({ kind: "broken", error }))
      .catch((error: unknown) => {
        log.error({ event: "field-job", id: row.id, error: describe(error) });
      })
      .finally(() => {
        this.running.delete(row.id);
        this.tell(row.id);
        this.pump();
      });
  }

  private async finish(
    row: FieldRow,
    outcome: FieldOutcome | { kind: "broken"; error: unknown },
  ): Promise<void> {
    if (this.closing) return;
    const { db, log, now } = this.options;
    if (outcome.kind === "broken") {
      log.error({ event: "field-job", id: row.id, error: describe(outcome.error) });
      const failure =
        outcome.error instanceof CheckFailure
          ? "One of the engine's own checks on the answer failed. Please report the id."
          : "The solution failed. Please report the id.";
      await this.settle(row, 0, 500, () =>
        updateOpenField(db, row.id, { status: "failed", failure, finishedAt: now() }),
      );
      return;
    }
    if (outcome.kind === "refused") {
      await this.settle(row, 0, 422, () =>
        updateOpenField(db, row.id, { status: "failed", failure: outcome.detail, finishedAt: now() }),
      );
      return;
    }
    // One that was cancelled meanwhile needs no map.
    const open = fieldById(db, row.id);
    if (!open || isFinished(open)) return;
    await this.files.write(row.id, outcome.map);
    if (this.closing) return;
    const { status, result } = outcome;
    const ended = await this.settle(row, fieldCost(result.mesh.unknowns), 200, () => {
      const recordId = row.record ? this.storeRecord(row, result) : null;
      return updateOpenField(db, row.id, {
        status,
        result: JSON.stringify(result),
        progress: progressOf(result) ?? row.progress,
        recordId,
        finishedAt: now(),
      });
    });
    if (!ended) await this.files.remove(row.id);
  }

  private storeRecord(
    row: FieldRow,
    result: { materials: { id: string; version: number }[] },
  ): string | null {
    if (!row.record) return null;
    const { label, teamId, actor } = row.record;
    return storeRecord(
      this.options.db,
      { teamId, actor, now: this.options.now() },
      {
        operation: "field",
        label,
        shape: null,
        request: JSON.parse(row.request),
        result,
        materials: result.materials,
      },
    );
  }

  /** The end of a solution and what it cost, in one transaction; then what was reserved beyond it is given back. */
  private async settle(row: FieldRow, cost: number, status: number, end: () => boolean): Promise<boolean> {
    const { db, limiter, now } = this.options;
    const { keyId, teamId, host, subject, quota, reserved, reservedAt } = row.charge;
    const ended = transact(db, () => {
      if (!end()) return false;
      if (cost === 0) return true;
      addComputations(db, now(), { keyId, teamId, operation: "solveField", status, computations: cost });
      if (host !== undefined)
        addEmbedComputations(db, { embedId: keyId, host, at: now(), computations: cost });
      return true;
    });
    if (ended && reserved > cost)
      await limiter.giveBack(monthBucket(subject, quota, reservedAt), reserved - cost);
    return ended;
  }

  /** Cancels an open solution; false where it was finished already. */
  async cancel(row: FieldRow): Promise<boolean> {
    const { db, now } = this.options;
    const cancelled = await this.settle(row, 0, 200, () =>
      updateOpenField(db, row.id, { status: "cancelled", finishedAt: now() }),
    );
    const at = this.waiting.findIndex(({ id }) => id === row.id);
    if (at >= 0) this.waiting.splice(at, 1);
    this.running.get(row.id)?.stop();
    this.tell(row.id);
    return cancelled;
  }

  /** Calls the listener with every change until the function it returns is called. */
  watch(id: string, listener: Listener): () => void {
    const set = this.listeners.get(id) ?? new Set();
    this.listeners.set(id, set.add(listener));
    return () => {
      set.delete(listener);
      if (set.size === 0) this.listeners.delete(id);
    };
  }

  /** Calls back when the service ends, until the function it returns is called: open streams end then. */
  onClose(closer: () => void): () => void {
    this.closers.add(closer);
    return () => this.closers.delete(closer);
  }

  /** Resolves when the solution is finished, after so many ms, or when the service ends. */
  waitFor(id: string, ms: number): Promise<void> {
    return new Promise((resolve) => {
      const row = fieldById(this.options.db, id);
      if (!row || isFinished(row)) return resolve();
      const done = () => {
        clearTimeout(timer);
        unwatch();
        unend();
        resolve();
      };
      const timer = setTimeout(done, ms);
      const unwatch = this.watch(id, (now) => {
        if (isFinished(now)) done();
      });
      const unend = this.onClose(done);
    });
  }

  private tell(id: string): void {
    const listeners = this.listeners.get(id);
    if (!listeners || this.closing) return;
    const row = fieldById(this.options.db, id);
    if (row) for (const listener of [...listeners]) listener(row);
  }

  private tellProgress(id: string, progress: FieldProgress): void {
    const listeners = this.listeners.get(id);
    if (!listeners || this.closing) return;
    const row = fieldById(this.options.db, id);
    if (row) for (const listener of [...listeners]) listener({ ...row, progress });
  }

  /** Solves a body on the same threads, beside the queue; nothing of it is stored. */
  solve(task: Omit<PoolTask, "onProgress">): Promise<FieldOutcome> {
    return this.options.runner.run({ ...task, onProgress: () => {} }).outcome;
  }

  /** Whether anything waits or runs in this process. */
  get busy(): boolean {
    return this.running.size > 0 || this.waiting.length > 0;
  }

  /** Whether another solution of this owner may be taken. */
  hasRoom(owner: string): boolean {
    const { db } = this.options;
    return countOpenFields(db, owner) < MOST_OPEN_OF_OWNER && countOpenFields(db) < MOST_OPEN;
  }

  /** Hands back what is not finished. The database must still be open. */
  close(): void {
    if (this.closing) return;
    this.closing = true;
    clearInterval(this.beat);
    releaseClaims(this.options.db, this.process);
    for (const task of this.running.values()) task.stop();
    for (const closer of [...this.closers]) closer();
    this.listeners.clear();
    void this.options.runner.close();
  }
}

export function isFinished({ status }: Pick<FieldRow, "status">): boolean {
  return status !== "queued" && status !== "running";
}

function progressOf(result: {
  resistance?: { lower: number; upper: number };
  mesh: { unknowns: number; refinements: number };
}): FieldProgress | null {
  const { resistance, mesh } = result;
  if (!resistance) return null;
  return {
    lower: resistance.lower,
    upper: resistance.upper,
    unknowns: mesh.unknowns,
    refinements: mesh.refinements,
  };
}

function describe(error: unknown): string {
  return error instanceof Error ? (error.stack ?? error.message) : String(error);
}
