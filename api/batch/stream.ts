import { addComputations } from "@/db/queries/usage";
import { SIGNED_OUT_ID } from "@/lib/auth/principal";
import { Refusal } from "@/lib/service/refusal";
import { bucketsOf } from "../call";
import type { CallContext } from "../operation";
import { ItemComputer, type ItemOutcome } from "./outcome";

/** How long the event loop is kept at a stretch, ms. */
const SLICE_MS = 8;

/** One step of a batch: an item, or text that belongs between items. */
export type BatchStep =
  | {
      readonly kind: "item";
      readonly request: unknown;
      /** Computations that it counts for if it is answered. */
      readonly cost: number;
      readonly write: (outcome: ItemOutcome) => string;
    }
  | { readonly kind: "refused"; readonly error: Error; readonly write: (outcome: ItemOutcome) => string }
  | { readonly kind: "text"; readonly text: string };

export interface Counts {
  readonly answered: number;
  readonly refused: number;
  readonly notComputed: number;
}

export interface BatchPlan {
  readonly operation: string;
  /** Computations that were reserved. */
  readonly reserved: number;
  readonly open: string;
  readonly steps: Iterator<BatchStep>;
  readonly close: (counts: Counts) => string;
}

/**
 * Works a batch off and gives its answer piece by piece, as items are ready and the reader takes them. The event loop
 * gets its turn between pieces. At the end, also where the reader leaves early, what was computed is counted and the
 * rest of what was reserved is given back, before the last byte goes out.
 */
export function batchStream(plan: BatchPlan, context: CallContext): ReadableStream<Uint8Array> {
  const { service, requestId } = context;
  const computer = new ItemComputer(context);
  const encoder = new TextEncoder();
  const limitMs = service.config.batchSeconds * 1000;
  const counts = { answered: 0, refused: 0, notComputed: 0 };
  let index = 0;
  let cost = 0;
  let spentMs = 0;
  let pending = plan.open;
  let settled = false;

  const perform = (step: BatchStep): string => {
    if (step.kind === "text") return step.text;
    const at = index++;
    if (spentMs >= limitMs) {
      counts.notComputed++;
      return step.write(computer.refused(at, timeIsUp(service.config.batchSeconds)));
    }
    const outcome =
      step.kind === "item" ? computer.compute(at, step.request) : computer.refused(at, step.error);
    if (outcome.status === 200) {
      counts.answered++;
      cost += step.kind === "item" ? step.cost : 0;
    } else counts.refused++;
    return step.write(outcome);
  };

  const settle = async (): Promise<void> => {
    if (settled) return;
    settled = true;
    await settleBatch(context, plan, cost);
  };

  return new ReadableStream<Uint8Array>(
    {
      async pull(controller) {
        // Other calls have their turn first.
        await new Promise((resolve) => setImmediate(resolve));
        try {
          const start = performance.now();
          const before = spentMs;
          const parts = [pending];
          pending = "";
          let ended = false;
          for (let taken = 0; taken < SLICE_MS;) {
            const { done, value } = plan.steps.next();
            if (done) {
              ended = true;
              break;
            }
            parts.push(perform(value));
            taken = performance.now() - start;
            spentMs = before + taken;
          }
          if (ended) {
            await settle();
            parts.push(plan.close(counts));
          }
          controller.enqueue(encoder.encode(parts.join("")));
          if (ended) controller.close();
        } catch (error) {
          service.log.error({ requestId, error: error instanceof Error ? error.stack : String(error) });
          await settle().catch(() => undefined);
          controller.error(error);
        }
      },
      cancel: settle,
    },
    // Nothing is computed before it is asked for: a slow reader holds up its own batch and no memory.
    { highWaterMark: 0 },
  );
}

function timeIsUp(seconds: number): Refusal {
  return new Refusal(
    "not-computed",
    `The ${seconds} s that a batch may take were over before this item. Send it again.`,
  );
}

/** Counts what was computed, and gives back what was reserved for the rest. */
async function settleBatch(
  { service, principal, requestId, now }: CallContext,
  { operation, reserved }: BatchPlan,
  cost: number,
): Promise<void> {
  if (principal.kind === "anonymous" || !service.db.$client.open) return;
  const key = principal.kind === "key" ? principal : { id: SIGNED_OUT_ID, teamId: "" };
  if (cost > 0) {
    await service.commits.run(() =>
      addComputations(service.db, service.now(), {
        keyId: key.id,
        teamId: key.teamId,
        operation,
        status: 200,
        computations: cost,
        call: { requestId, since: now },
      }),
    );
  }
  const { month } = bucketsOf(principal, now);
  if (reserved > cost) await service.limiter.giveBack(month, reserved - cost);
}
