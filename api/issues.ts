import type { z } from "zod";
import { pointerTo, schemaComplaints } from "@/lib/engine";
import type { Complaint } from "@/lib/service/refusal";

type ParameterComplaint = Extract<Complaint, { parameter: string }>;

type Issue = z.core.$ZodIssue;

/** What a schema found wrong with a body. */
export function bodyComplaints(schema: z.ZodType, issues: readonly Issue[]): Complaint[] {
  return schemaComplaints(schema, issues).map(({ path, detail }) => ({
    pointer: pointerTo("#", ...path),
    detail,
  }));
}

/** The same for query or path parameters, which have a name only. */
export function parameterComplaints(schema: z.ZodType, issues: readonly Issue[]): ParameterComplaint[] {
  return schemaComplaints(schema, issues).map(({ path, detail }) => ({
    parameter: path.map(String).join("."),
    detail,
  }));
}
