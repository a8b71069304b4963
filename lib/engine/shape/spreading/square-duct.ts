/**
 * A round cylinder centred in an equipotential square duct: 2πRL/ρ as a function of δ = diameter/side.
 *
 * Reflections make the square a lattice of cylinders of alternating sign; Rayleigh's multipole method on it (Phil. Mag.
 * 34 (1892) 481, from memory) gives a power series in δ⁸, whose coefficients are lattice sums and were computed here
 * with 45 digits. Near touching each of the eight halves of a gap becomes a long strip in bipolar coordinates, of length
 * π/μ less a constant K that is a smooth function of μ² (cosh μ = 1/δ); its expansion was computed here from solutions of
 * up to 400 multipoles with 33 digits. Both agree with each other to 2e-15 where they meet.
 */
import { acosh1p } from "../../numeric/acosh1p";
import { sumChebyshev } from "../../numeric/chebyshev";
import { solveInPlace } from "../../numeric/lu-solve";

/** 4·√(4π)/Γ(¼)², the factor for a thin wire in a square duct. */
const THIN_WIRE = 1.0787052023767587;

/** Where the series hands over to the strips: cosh μ = 1/0.85. */
const SWITCH = 0.85;

/** Coefficients of δ⁸, δ¹⁶, …; the first left out is below 1e-20 at the switch. */
const SERIES: readonly number[] = [
  -0.021819148862956293, -0.011134871291151087, -0.0060071084503192755, -0.004241033061385251,
  -0.0029385110152326615, -0.0023270221574151059, -0.0018293053776741283, -0.0015132753989921762,
  -0.0012694741862403452, -0.0010892939506006968, -0.00094478821559542368, -0.00083140160156177072,
  -0.00073833964830515378, -0.0006616538514054249, -0.00059724860171077733, -0.00054272678890455268,
  -0.00049598423039990606, -0.00045560497794063925, -0.00042041241750122044, -0.00038953090333948402,
  -0.00036225073262941704, -0.00033801336983531365, -0.00031636239468699505, -0.00029692803446728565,
  -0.00027940475720002731, -0.00026353963015059606, -0.00024912093496815647, -0.00023597062007289682,
  -0.00022393778158059184, -0.00021289387248275973,
];

/** K as a Chebyshev series in μ². */
const STRIP_END = {
  from: 0,
  to: 0.36,
  coefficients: [
    2.1269242651348659, -0.1828683873091938, 0.012856306359427231, -0.0010599650771950235,
    9.4810087393775602e-5, -8.9068108472422574e-6, 8.6455475108510958e-7, -8.5902321505024545e-8,
    8.686459753234345e-9, -8.9039008044147985e-10, 9.2277117662280787e-11, -9.6501854692158652e-12,
    1.0162236116185124e-12, -1.0772733705261879e-13, 1.1510697752307977e-14, -1.2308674327542507e-15,
  ],
};

export interface SquareDuct {
  readonly diameter: number;
  readonly side: number;
}

/** 2πRL/ρ for diameter < side; relative error below 1e-14 of the stated problem. */
export function squareDuctSpan({ diameter, side }: SquareDuct): number {
  const delta = diameter / side;
  if (delta <= SWITCH) {
    const power = delta ** 8;
    let series = 0;
    for (let j = SERIES.length - 1; j >= 0; j--) series = (series + SERIES[j]) * power;
    return Math.log(THIN_WIRE / delta) + series;
  }
  const mu = acosh1p((side - diameter) / diameter);
  return Math.PI / 4 / (Math.PI / mu - sumChebyshev(STRIP_END, mu * mu));
}

/**
 * The same by collocation, an independent route good to 1e-11 for δ ≤ 0.8: potential A·ln(r/a) + Σcₙ(rⁿ − a²ⁿr⁻ⁿ)·cos nθ, n = 4, 8, …,
 * made 1 on one side of the square. It also gives the field on the cylinder, which is largest where the side is nearest.
 */
export function squareDuctCollocation(delta: number, terms = 16): { span: number; fieldTimesRadius: number } {
  // Lengths in half sides; radii to the power n are taken relative to that half side, so all entries stay near 1.
  const rows: number[][] = [];
  for (let i = 0; i <= terms; i++) {
    const angle = (Math.PI / 8) * (1 - Math.cos((Math.PI * (i + 0.5)) / (terms + 1)));
    const radius = 1 / Math.cos(angle);
    const row = [Math.log(radius / delta)];
    for (let k = 1; k <= terms; k++) {
      const n = 4 * k;
      row.push((radius ** n - delta ** n * (delta / radius) ** n) * Math.cos(n * angle) * 2 ** (-n / 2));
    }
    rows.push(row);
  }
  const solution = solveInPlace(Float64Array.from(rows.flat()), new Float64Array(terms + 1).fill(1));
  let field = solution[0];
  for (let k = 1; k <= terms; k++) {
    const n = 4 * k;
    field += solution[k] * 2 * n * delta ** n * 2 ** (-n / 2);
  }
  return { span: 1 / solution[0], fieldTimesRadius: field };
}
