/** How far a network's resistance strays with its elements: dR/dRₖ = (iₖ/i)², and R never falls when an Rₖ rises. */
import { COVERAGE_FACTOR, rangeOf } from "../resistance/uncertainty/find-uncertainty";
import { COVERAGE } from "../resistance/uncertainty/monte-carlo";
import type { NetworkElement } from "./read-elements";
import type { NetworkUncertainty } from "./result-schema";
import type { MaterialStray } from "./stray";

/** One element at a corner of the tolerances: its resistance by its place among those that carry current. */
export type Corner = (element: NetworkElement, place: number) => number;

const high: Corner = ({ ohm, stray }) => stray?.high ?? ohm;
const low: Corner = ({ ohm, stray }) => stray?.low ?? ohm;

/** All high, all low, and in turns both ways: in parallel it is unequal elements that bend the resistance. */
export const CORNERS: readonly Corner[] = [
  high,
  low,
  (element, place) => (place % 2 === 0 ? high : low)(element, place),
  (element, place) => (place % 2 === 0 ? low : high)(element, place),
];

/** Part of what the first order spans by which a corner may be off it. */
const BENT = 0.1;

interface Solved {
  readonly names: readonly string[];
  readonly elements: readonly NetworkElement[];
  /** dR/dRₖ of each element. */
  readonly sensitivity: Float64Array;
  /** Ohms. */
  readonly value: number;
  /** Ohms at each of CORNERS. */
  readonly corners: readonly number[];
}

interface Found {
  readonly uncertainty: NetworkUncertainty;
  readonly cautions: readonly string[];
}

export function findNetworkUncertainty(method: NetworkUncertainty["method"], solved: Solved): Found {
  const { names, elements, sensitivity, value, corners } = solved;
  const strays = elements.flatMap(({ stray }, e) =>
    stray ? [{ name: names[e], sensitivity: sensitivity[e], stray }] : [],
  );
  const cautions = strays.length === 0 ? ["No element has a tolerance, so the uncertainty is zero."] : [];
  const materials = sharedMaterials(strays);
  const parts = [
    ...strays.map(({ name, sensitivity: slope, stray }) => ({
      element: name,
      sensitivity: slope,
      standard: stray.own,
    })),
    ...[...materials].map(([material, part]) => ({ material, ...part })),
  ];
  const variance = parts.reduce((sum, part) => sum + (part.sensitivity * part.standard) ** 2, 0);
  const standard = Math.sqrt(variance);
  if (method === "worst-case") {
    const spans = strays.map(({ sensitivity: slope, stray }) => slope * (stray.high - stray.low));
    const whole = spans.reduce((sum, span) => sum + span, 0);
    return {
      uncertainty: {
        method,
        standard,
        ...rangeOf(Math.min(corners[1], value), Math.max(corners[0], value)),
        coverage: 1,
        basis:
          "A network's resistance never falls when an element's rises, so its extremes are those of all elements at their lowest and of all at their highest.",
        contributions: strays
          .map(({ name, sensitivity: slope, stray }, k) => ({
            element: name,
            sensitivity: slope,
            standard: totalOf(stray),
            share: whole > 0 ? spans[k] / whole : 0,
          }))
          .sort((a, b) => b.share - a.share),
      },
      cautions,
    };
  }
  const shift = strays.reduce((sum, { sensitivity: slope, stray }) => sum + slope * stray.shift, 0);
  let from = value + shift - COVERAGE_FACTOR * standard;
  let to = value + shift + COVERAGE_FACTOR * standard;
  if (strays.some(({ stray }) => stray.rough) || bent(solved)) {
    from = Math.min(from, ...corners);
    to = Math.max(to, ...corners);
    cautions.push(
      "The resistance is not straight over the tolerances of the elements, so first-order propagation is rough here; its range is widened to the values at their ends. worst-case needs no such step.",
    );
  }
  return {
    uncertainty: {
      method,
      standard,
      ...rangeOf(from, to),
      coverage: COVERAGE,
      basis: `First order (JCGM 100, 5.1.2): elements taken as independent, but those of one material as straying together with its stated uncertainty; the range is ±1.96 standard uncertainties${shift === 0 ? "" : " about the expectation, which tolerances of unequal sides move"}.`,
      contributions: parts
        .map((part) => ({
          ...part,
          share: variance > 0 ? (part.sensitivity * part.standard) ** 2 / variance : 0,
        }))
        .sort((a, b) => b.share - a.share),
    },
    cautions,
  };
}

interface Straying {
  readonly sensitivity: number;
  readonly stray: NonNullable<NetworkElement["stray"]>;
}

/** What each material does to the network, all its elements together. */
function sharedMaterials(strays: readonly Straying[]): Map<string, MaterialStray> {
  const found = new Map<string, MaterialStray>();
  for (const { sensitivity, stray } of strays) {
    for (const [id, part] of stray.materials) {
      const before = found.get(id)?.sensitivity ?? 0;
      found.set(id, { sensitivity: before + sensitivity * part.sensitivity, standard: part.standard });
    }
  }
  return found;
}

function totalOf({ own, materials }: Straying["stray"]): number {
  return Math.hypot(own, ...[...materials.values()].map((part) => part.sensitivity * part.standard));
}

/** Whether a corner lies further from the first order than this may be off. */
function bent({ elements, sensitivity, value, corners }: Solved): boolean {
  const carrying = [...elements.entries()].filter(([e]) => sensitivity[e] > 0);
  const steps = CORNERS.map((corner) => {
    let [straight, spread] = [0, 0];
    for (const [place, [e, element]] of carrying.entries()) {
      const step = sensitivity[e] * (corner(element, place) - element.ohm);
      straight += step;
      spread += Math.abs(step);
    }
    return { straight, spread };
  });
  return steps.some(({ straight, spread }, k) => {
    const rest = Math.abs(corners[k] - value - straight);
    return rest > 1e-9 * value && rest > BENT * spread;
  });
}
