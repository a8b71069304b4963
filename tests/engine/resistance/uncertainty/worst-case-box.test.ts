/** The worst case against its definition: no corner and no inner point of the box of tolerances lies outside its range. */
import { describe, expect, it } from "vitest";
import { catalogue, exampleRequest, InputError } from "@/lib/engine";
import { Random } from "@/lib/engine/numeric/random";
import { compute } from "../../../support/compute";

/** Inner points of each box beside its corners. */
const INNER = 16;
/** Widest tolerances, per cent: the first of these whose box the shape admits. */
const WIDEST = [12, 3, 0.5];
/** Two evaluations of one point differ by no more than this. */
const ROUNDING = 1e-12;

/** Shapes of one medium that answer by a formula alone, in no time: the others take a field solution or hundreds of terms. */
const QUICK = catalogue.filter(
  ({ answer }) =>
    answer.kind === "flow" ||
    (answer.kind === "factor" && answer.planIsWhole === undefined && answer.work === undefined),
);

interface Input {
  readonly name: string;
  readonly number: number;
  readonly unit: string;
}

/** What has a unit, or is an angle in degrees; whole numbers and choices have no tolerance. */
function quantitiesOf(dimensions: Readonly<Record<string, unknown>>): Input[] {
  return Object.entries(dimensions).flatMap(([name, value]) => {
    const found = /^([\d.]+(?:e[+-]?\d+)?) ?([a-zµ]+(?:\^2)?)$/i.exec(String(value));
    return found ? [{ name, number: Number(found[1]), unit: found[2] }] : [];
  });
}

describe("the worst case of a random box", () => {
  it.each(QUICK.map((shape, place) => [shape.id, shape, place] as const))("%s", (id, shape, place) => {
    const random = new Random(4100 + place);
    const { dimensions } = exampleRequest(shape) as { dimensions: Readonly<Record<string, unknown>> };
    const medium = shape.family === "sheet" ? { sheetResistance: 50 } : { resistivity: 1.7e-8 };
    const inputs = quantitiesOf(dimensions);
    expect(inputs.length).toBeGreaterThan(0);
    const answer = (given: object, more: object = {}) =>
      compute({ shape: id, dimensions: { ...dimensions, ...given }, medium, include: [], ...more });

    const box = WIDEST.map((widest) => inputs.map(() => widest * random.uniform()));
    const [range, percents] = firstAdmitted(box, (shares) => {
      const given = inputs.map(({ name, number, unit }, k) => [
        name,
        { value: `${number} ${unit}`, tolerance: `${shares[k]} %` },
      ]);
      const { uncertainty } = answer(Object.fromEntries(given), { uncertainty: { method: "worst-case" } });
      if (!uncertainty) throw new Error("no uncertainty");
      return uncertainty;
    });

    /** The resistance where each input stands at −1 … 1 of its tolerance. */
    const at = (places: readonly number[]): number => {
      const given = inputs.map(({ name, number, unit }, k) => [
        name,
        `${number * (1 + (percents[k] / 100) * places[k])} ${unit}`,
      ]);
      return answer(Object.fromEntries(given)).resistance.value;
    };
    const corners = Array.from({ length: 2 ** inputs.length }, (_, corner) =>
      inputs.map((_, k) => ((corner >> k) & 1 ? 1 : -1)),
    );
    const inner = Array.from({ length: INNER }, () => inputs.map(() => 2 * random.uniform() - 1));
    for (const point of [...corners, ...inner]) {
      const value = at(point);
      const told = `${value} at ${point.join(", ")} of ±${percents.join(", ")} %`;
      expect(value, told).toBeGreaterThanOrEqual(range.low * (1 - ROUNDING));
      expect(value, told).toBeLessThanOrEqual(range.high * (1 + ROUNDING));
    }
    // And the range is no wider than it need be: where every input is monotone its ends are corners.
    const values = corners.map(at);
    expect(range.low / Math.min(...values)).toBeGreaterThan(0.98);
    expect(range.high / Math.max(...values)).toBeLessThan(1.02);
  });
});

function firstAdmitted<Box, Range>(boxes: readonly Box[], of: (box: Box) => Range): [Range, Box] {
  for (const box of boxes) {
    try {
      return [of(box), box];
    } catch (error) {
      if (!(error instanceof InputError)) throw error;
    }
  }
  throw new Error("the shape admits none of the boxes");
}
