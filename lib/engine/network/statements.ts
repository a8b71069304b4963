/** What has to be said beside the numbers of a network. */
import { UNUSED_TOLERANCES } from "../resistance/compute-resistance";
import { NO_TOLERANCE } from "../resistance/uncertainty/find-uncertainty";
import type { NetworkElement } from "./read-elements";
import type { NetworkRequest } from "./request-schema";
import type { NetworkResult } from "./result-schema";

type Statements = Pick<NetworkResult, "cautions" | "assumptions" | "sources" | "materials">;

const JOINED =
  "Elements meet at their nodes without resistance of their own; a joint's is an element of its own.";
const METHOD = {
  title: "Star–mesh elimination without subtraction, bounds by Rayleigh's monotonicity law",
  detail: "Kirchhoff's laws; dR/dRₖ = (iₖ/i)²",
  provenance: "derived here",
} as const;

/** Cautions, assumptions, sources and materials of the elements, each told once. */
export function collectStatements(
  { elements: inputs }: NetworkRequest,
  elements: readonly NetworkElement[],
  carrying: Uint8Array,
  uncertain: boolean,
): Statements {
  const cautions = new Set<string>();
  const assumptions = new Set([JOINED]);
  const sources = new Map<string, NetworkResult["sources"][number]>([[METHOD.title, METHOD]]);
  const materials = new Map<string, NetworkResult["materials"][number]>();
  const idle = inputs.filter((_, e) => !carrying[e]).map(({ name }) => `"${name}"`);
  if (idle.length > 0) {
    const more = idle.length > 5 ? ` and ${idle.length - 5} more` : "";
    const verb = idle.length === 1 ? "carries" : "carry";
    cautions.add(
      `${idle.slice(0, 5).join(", ")}${more} ${verb} no current: no way through leads from port to port.`,
    );
  }
  for (const { result, toleranced } of elements) {
    if (toleranced && !uncertain) assumptions.add(UNUSED_TOLERANCES);
    if (!result) continue;
    // That one element has no tolerance says nothing of the network.
    for (const caution of result.cautions) if (caution !== NO_TOLERANCE) cautions.add(caution);
    for (const assumption of result.assumptions) assumptions.add(assumption);
    for (const source of result.sources) sources.set(source.title + (source.detail ?? ""), source);
    for (const material of result.materials) materials.set(material.id, material);
  }
  return {
    cautions: [...cautions],
    assumptions: [...assumptions],
    sources: [...sources.values()],
    materials: [...materials.values()],
  };
}
