import { Refusal } from "../service/refusal";

/**
 * An uncertainty such as `2 %` (or `0.02`) as the ratios of a material: the true resistivity lies between (1 − u) and
 * (1 + u) times the nominal one. Refuses anything but a share above 0 and below 100 %.
 */
export function statedUncertainty(text: string): { lower: number; upper: number; note: string } {
  const match = /^(\d+(?:\.\d*)?|\.\d+)\s*(%?)$/.exec(text.trim());
  const share = match ? Number(match[1]) / (match[2] ? 100 : 1) : NaN;
  if (!(share > 0 && share < 1)) {
    throw new Refusal("invalid-input", "The parameter uncertainty cannot be used.", {
      errors: [
        { parameter: "uncertainty", detail: 'must be a share such as "2 %", above 0 and below 100 %.' },
      ],
    });
  }
  return { lower: 1 - share, upper: 1 + share, note: `Stated with the table: ±${text.trim()}.` };
}
