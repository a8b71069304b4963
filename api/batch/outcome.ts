import { InputError, type Material, type ResistanceResult } from "@/lib/engine";
import { computeResistance } from "@/lib/engine";
import { usableMaterial } from "@/lib/materials/team-materials";
import { Refusal } from "@/lib/service/refusal";
import { bodyRefusal } from "../body";
import { overdueAfter } from "../deadline";
import type { CallContext } from "../operation";
import { type ProblemDocument, problemDocument } from "../respond";

/** An item that takes longer, by the trials it asks for, is refused: the others wait meanwhile. */
const LONGEST_ITEM_MS = 1_000;

/** What one item of a batch is answered with. */
export type ItemOutcome =
  | { readonly index: number; readonly status: 200; readonly result: ResistanceResult }
  | { readonly index: number; readonly status: number; readonly problem: ProblemDocument };

/** Computes the items of one batch, each on its own; a material is looked up once. */
export class ItemComputer {
  private readonly materials = new Map<string, Material | undefined>();
  private readonly teamId: string | undefined;

  constructor(private readonly context: CallContext) {
    const { principal } = context;
    this.teamId = principal.kind === "key" ? principal.teamId : undefined;
  }

  /** Never throws: a mistake of the caller and a defect of ours are the outcome of this item only. */
  compute(index: number, request: unknown): ItemOutcome {
    try {
      if (typeof request === "object" && request !== null && "record" in request) {
        throw new InputError([
          { pointer: "#/record", detail: "is not for items of a batch: send the request by itself." },
        ]);
      }
      return {
        index,
        status: 200,
        result: computeResistance(request, {
          material: this.material,
          overdue: overdueAfter(LONGEST_ITEM_MS),
        }),
      };
    } catch (error) {
      return this.refused(index, error);
    }
  }

  refused(index: number, error: unknown): ItemOutcome {
    const { service, requestId } = this.context;
    let refusal: Refusal;
    if (error instanceof InputError) refusal = bodyRefusal(error.errors);
    else if (error instanceof Refusal) refusal = error;
    else {
      service.log.error({
        requestId,
        item: index,
        error: error instanceof Error ? (error.stack ?? error.message) : String(error),
      });
      refusal = new Refusal("internal", "This item failed. Please report the request id.");
    }
    const problem = problemDocument(refusal, `${requestId}/items/${index}`, service.config.origin);
    return { index, status: problem.status, problem };
  }

  private readonly material = (id: string): Material | undefined => {
    if (this.materials.has(id)) return this.materials.get(id);
    const material = usableMaterial(this.context.service.db, this.teamId, id);
    this.materials.set(id, material);
    return material;
  };
}
