/** Warmed worker threads that solve field problems, started when the first one comes or at the service's start. */
import { join } from "node:path";
import { MessageChannel } from "node:worker_threads";
import { Piscina } from "piscina";
import type { FieldProgress, Material } from "@/lib/engine";
import { type FieldOutcome, runFieldTask } from "./field-task";
import { WARMING_BEND } from "./warming-body";

export interface PoolTask {
  readonly body: unknown;
  readonly materials: readonly Material[];
  readonly secondsAllowed: number;
  readonly maximumUnknowns: number;
  readonly onProgress: (progress: FieldProgress) => void;
}

/** A task that runs; `stop` makes it end with what it has reached. */
export interface RunningTask {
  readonly outcome: Promise<FieldOutcome>;
  readonly stop: () => void;
}

/** What works tasks off. */
export interface TaskRunner {
  /** How many tasks run at once. */
  readonly threads: number;
  /** Makes ready; resolves when the first task will be worked off as fast as later ones. */
  start(): Promise<void>;
  run(task: PoolTask): RunningTask;
  close(): Promise<void>;
}

/** Solves in this very thread, one after the other and without a clock: for documents that must come out the same. */
export class InlineRunner implements TaskRunner {
  readonly threads = 1;

  async start(): Promise<void> {}

  run({ body, materials, secondsAllowed, maximumUnknowns }: PoolTask): RunningTask {
    const cancel = new Int32Array(1);
    const task = { body, materials, secondsAllowed, maximumUnknowns, cancel };
    const outcome = Promise.resolve().then(() => runFieldTask(task, () => 0));
    return { outcome, stop: () => (cancel[0] = 1) };
  }

  async close(): Promise<void> {}
}

export class WorkerPool implements TaskRunner {
  private pool: Piscina | undefined;

  constructor(readonly threads: number) {}

  /** Starts the threads, which warm themselves, and gives each a task: then the way to them is warm too. */
  async start(): Promise<void> {
    const task = {
      body: WARMING_BEND,
      materials: [],
      secondsAllowed: 5,
      maximumUnknowns: 20_000,
      onProgress: () => {},
    };
    await Promise.all(Array.from({ length: this.threads }, () => this.run(task).outcome));
  }

  private threadPool(): Piscina {
    return (this.pool ??= new Piscina({
      filename: join(/* turbopackIgnore: true */ process.cwd(), "dist", "workers", "field-worker.mjs"),
      minThreads: this.threads,
      maxThreads: this.threads,
      resourceLimits: { maxOldGenerationSizeMb: 2048 },
    }));
  }

  run({ onProgress, ...task }: PoolTask): RunningTask {
    const cancel = new Int32Array(new SharedArrayBuffer(4));
    const { port1, port2 } = new MessageChannel();
    port1.on("message", onProgress);
    port1.unref();
    const outcome = this.threadPool()
      .run({ ...task, cancel, port: port2 }, { transferList: [port2] })
      .finally(() => port1.close());
    return { outcome, stop: () => Atomics.store(cancel, 0, 1) };
  }

  async close(): Promise<void> {
    await this.pool?.destroy();
    this.pool = undefined;
  }
}
