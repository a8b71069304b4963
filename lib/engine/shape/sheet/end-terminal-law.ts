/**
 * A rectangular sheet with one whole end as a terminal and the other end covered over a part that starts at one edge:
 * exact in squares, from the widest to the narrowest terminal and from the longest to the shortest sheet.
 *
 * The sheet is mapped to a quarter plane by the elliptic sine; R = K(κ')/K(κ) = agm(1, κ')/agm(1, κ). For L ≥ W the
 * moduli come from theta functions of the nome exp(−πL/W), for L < W from their imaginary transformation with nome
 * exp(−πW/L), where the common exponential is taken out by hand.
 */
import { agm } from "../../numeric/agm";
import { theta } from "../../numeric/theta";

export interface EndTerminal {
  readonly length: number;
  readonly width: number;
  /** Length of the partial terminal, at most the width. */
  readonly terminal: number;
}

/** From this L/W on the nome is below rounding and the long-sheet law is exact. */
const LONG = 13;
const MOST_TERMS = 60;

/** Squares of the sheet; relative error below 1e-14. */
export function endTerminalSquares(sheet: EndTerminal): number {
  const { length, width } = sheet;
  if (sheet.terminal >= width) return length / width;
  if (length >= LONG * width)
    return length / width + longSheetExcess(sheet.terminal / width, width - sheet.terminal, width);
  return length >= width ? endTerminalByLongNome(sheet) : endTerminalByShortNome(sheet);
}

/** −(2/π)·ln sin(πc/2W), the squares that a partial terminal of c = part·W adds to a long sheet. */
function longSheetExcess(part: number, uncovered: number, width: number): number {
  // Near full width the sine is near 1 and the cosine carries the digits.
  if (part > 0.5) {
    const cosine = Math.sin((Math.PI / 2) * (uncovered / width));
    return -Math.log1p(-cosine * cosine) / Math.PI;
  }
  return (-2 / Math.PI) * Math.log(Math.sin((Math.PI / 2) * part));
}

/** K(κ')/K(κ) with ln κ' given where κ' itself may underflow: agm(1, κ') → π/(2·ln(4/κ')). */
function squares(kappa: number, logComplement: number): number {
  const upper =
    logComplement < -300 ? Math.PI / 2 / (Math.log(4) - logComplement) : agm(1, Math.exp(logComplement));
  return upper / agm(1, kappa);
}

/** For sheets that are not short (nome exp(−πL/W) of at most about exp(−π/4)). */
export function endTerminalByLongNome({ length, width, terminal }: EndTerminal): number {
  const q = Math.exp(-Math.PI * (length / width));
  const v = (Math.PI / 2) * (terminal / width);
  const zero = theta(0, q);
  const at = theta(v, q);
  const kappa = 4 * Math.sqrt(q) * (zero.second / zero.third) * (at.first / at.fourth);
  const complement = (zero.fourth / zero.third) * (at.third / at.fourth);
  return squares(kappa, Math.log(complement));
}

/** For sheets that are not long (nome exp(−πW/L) of at most about exp(−π/4)). */
export function endTerminalByShortNome({ length, width, terminal }: EndTerminal): number {
  const aspect = width / length;
  const q = Math.exp(-Math.PI * aspect);
  const y = (Math.PI / 2) * (terminal / length);
  const uncovered = Math.PI * ((width - terminal) / length);
  const zero = theta(0, q);
  // S₁ and C₂ over q^(1/4)·e^y, C₃ as it stands. The exponents are written with the uncovered width, since
  // 2y − πW/L = −π(W−c)/L is their small difference.
  let sine = -0.5 * Math.expm1(-2 * y);
  let cosine = 0.5 * (1 + Math.exp(-2 * y));
  let third = 0.5;
  for (let n = 1; n < MOST_TERMS; n++) {
    const rise = -n * n * Math.PI * aspect - n * uncovered;
    const even = Math.exp(-n * (n - 1) * Math.PI * aspect - n * uncovered);
    const odd = Math.exp(rise);
    third += 0.5 * even * (1 + Math.exp(-4 * n * y));
    sine += (n % 2 === 0 ? -0.5 : 0.5) * odd * Math.expm1(-(4 * n + 2) * y);
    cosine += 0.5 * odd * (1 + Math.exp(-(4 * n + 2) * y));
    if (even < 1e-18) break;
  }
  const kappa = (zero.fourth / zero.third) * (sine / cosine);
  const logComplement = -y + Math.log(((2 * zero.second) / zero.third) * (third / cosine));
  return squares(kappa, logComplement);
}
