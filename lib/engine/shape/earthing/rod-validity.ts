/** Where the formulas for rods and wires leave their range, in words for the caution of an answer. */

/** A rod's length against its diameter. */
export function rodCautions(length: number, diameter: number): string[] {
  const slenderness = length / diameter;
  if (slenderness >= 10) return [];
  const shown = slenderness.toPrecision(2);
  return slenderness >= 2.5
    ? [
        `The rod is only ${shown} diameters long; the formula is meant for 10 and more, and its bounds are wider here.`,
      ]
    : [
        `The rod is only ${shown} diameters long: it is no longer a rod, and the value is a rough one; a hemisphere or a plate describes it better.`,
      ];
}

/** A buried wire's length and depth against its diameter. */
export function wireCautions(length: number, diameter: number, depth: number, name: string): string[] {
  const cautions: string[] = [];
  if (length < 10 * diameter) {
    cautions.push(
      `The ${name} is only ${(length / diameter).toPrecision(2)} diameters long; the formula is meant for 10 and more, and its bounds are wider here.`,
    );
  }
  return [...cautions, ...shallowCautions(diameter, depth)];
}

/** A buried wire's depth against its diameter. */
export function shallowCautions(diameter: number, depth: number): string[] {
  return depth < 2 * diameter
    ? [
        `The depth is only ${(depth / diameter).toPrecision(2)} wire diameters: so near the surface the soil is rarely uniform, and the current leaves the wire unevenly.`,
      ]
    : [];
}

/** The published series for a wire, ring or star hold while twice the depth is at most its half length or arm. */
export function depthCaution(depth: number, reach: number, of: string): string[] {
  return depth > reach / 2
    ? [
        `The depth is more than half of ${of}: the published series no longer hold there; the value is computed without them.`,
      ]
    : [];
}

/** Rods closer together than their length share the soil. */
export function spacingCautions(spacing: number, length: number, diameter: number): string[] {
  const cautions: string[] = [];
  if (spacing < 4 * diameter) {
    cautions.push(
      `The rods are only ${(spacing / diameter).toPrecision(2)} diameters apart: they act like one thick rod, and the current leaves them on their outer sides.`,
    );
  } else if (spacing < length) {
    cautions.push(
      "The rods are closer together than they are long; a wider spacing would lower the resistance.",
    );
  }
  return cautions;
}
