/** Where the method of a field solution comes from, as shapes tell the sources of their laws. */
import type { ResultSource } from "../resistance/result-schema";
import type { OutlineInput } from "./outline/schema";

const PRINCIPLES: ResultSource = {
  title: "Principles of Dirichlet and Thomson",
  detail:
    "The energy of any potential with the terminals' values bounds the resistance from below, that of any flow of the whole current from above.",
  provenance: "from memory",
};
const ELEMENTS: ResultSource = {
  title: "Potential and stream function by finite elements on one mesh, refined where their energies differ",
  provenance: "derived here",
};
const MONOTONICITY: ResultSource = {
  title: "Lord Rayleigh, On the theory of resonance, Phil. Trans. 161 (1871) 77",
  detail: "More conductor has never more resistance: an arc lies between polygons within and around it.",
  provenance: "from memory",
};

/** @param outline Arcs have a source of their own. */
export function fieldSources({ outer, holes }: Pick<OutlineInput, "outer" | "holes">): ResultSource[] {
  const arcs = [outer, ...holes].some((ring) => ring.some((vertex) => !Array.isArray(vertex)));
  return [PRINCIPLES, ELEMENTS, ...(arcs ? [MONOTONICITY] : [])];
}
