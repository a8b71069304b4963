/** A request for a field solution to a problem that is ready to be solved, or every complaint about it. */
import { InputError, Problems } from "../../failure";
import { Collected } from "../../medium/collected";
import type { Material } from "../../medium/material";
import { type OperatingInput, readOperating } from "../../resistance/operating-point";
import { addSchemaComplaints } from "../../schema-complaints";
import { readRequirement, type Requirement } from "../../resistance/requirement";
import { checkOutline } from "../outline/check-outline";
import type { OutlineInput, TerminalInput } from "../outline/schema";
import type { FieldProblem } from "../solve-field";
import { checkExpression, resolveFieldMedium } from "./field-medium";
import { type FieldRequest, fieldRequestSchema } from "./field-request-schema";

/** An outline that was stored before, with what was found on it. */
export interface StoredOutline {
  readonly outline: OutlineInput;
  readonly terminals: readonly TerminalInput[];
}

export interface FieldContext {
  /** The material of that id which the caller may use, or undefined. */
  readonly material: (id: string) => Material | undefined;
  /** The stored outline of that id which the caller may use, or undefined. */
  readonly outline: (id: string) => StoredOutline | undefined;
}

export interface PreparedField {
  readonly request: FieldRequest;
  /** The same problem as a body that needs nothing stored: to be solved later, or again. */
  readonly body: Omit<FieldRequest, "outlineId" | "record">;
  readonly problem: FieldProblem;
  /** Largest relative rounding error of the medium's numbers; the bounds are widened by it. */
  readonly mediumError: number;
  readonly operating: OperatingInput;
  readonly requirement: Requirement | null;
  readonly collected: Collected;
}

/** Below it the outline's conductance has no resistance a double can hold with its bounds. */
const LARGEST_CONDUCTANCE = 1e150;

/**
 * Reads and checks a whole request.
 * @param body the body of `POST /fields` as it arrived.
 * @throws InputError with every complaint found.
 */
export function prepareField(body: unknown, context: FieldContext): PreparedField {
  const problems = new Problems();
  const parsed = fieldRequestSchema.safeParse(body, { reportInput: true });
  if (!parsed.success) {
    addSchemaComplaints(fieldRequestSchema, parsed.error.issues, "#", problems);
    throw new InputError(problems.list);
  }
  const request = parsed.data;
  const stored = request.outlineId === undefined ? undefined : context.outline(request.outlineId);
  if (request.outlineId !== undefined && !stored) {
    problems.add("#/outlineId", `"${request.outlineId}" is no stored outline of your team.`);
  }
  const operating = readOperating(request.operating, problems);
  const requirement = readRequirement(request.requirement, problems);
  const outline = request.outline ?? stored?.outline;
  const terminals = request.terminals ?? stored?.terminals;
  const without = stored !== undefined && request.terminals === undefined && terminals?.length === 0;
  if (without) problems.add("#/terminals", "is required: the stored outline has no terminals of its own.");
  const collected = new Collected();
  const medium = resolveFieldMedium(request.medium, {
    axisymmetric: outline?.symmetry === "axisymmetric",
    temperatureC: operating.temperatureC,
    material: context.material,
    collected,
    problems,
  });
  // The schema saw to it that only an unknown outline leaves these open, and that was told above.
  if (!outline || !terminals || without) throw new InputError(problems.list);
  const check = checkOutline({
    outline,
    terminals,
    regions: request.medium.regions?.map(({ ring }) => ring),
  });
  if (!check.ok) problems.addAll(check.errors);
  if (check.ok && medium) {
    checkExpression(check.outline, medium.conductance, problems);
    const extreme = medium.conductance.some(
      (c) => typeof c === "number" && !(c < LARGEST_CONDUCTANCE && c > 1 / LARGEST_CONDUCTANCE),
    );
    if (extreme) problems.add("#/medium", "gives a conductance beyond 1e-150 … 1e150 siemens.");
  }
  problems.throwIfAny();
  if (!check.ok || !medium) throw new InputError(problems.list);
  const { outlineId: _id, record: _record, ...rest } = request;
  return {
    request,
    body: { ...rest, outline, terminals: [...terminals] },
    problem: { outline: check.outline, conductance: medium.conductance },
    mediumError: medium.relativeError,
    operating,
    requirement,
    collected,
  };
}
