/**
 * The units that a quantity may be written in, and nothing else: one declarative table. Derived units are written with
 * these by products, quotients and powers ("ohm mm^2/m", "S/cm", "1/K").
 */

/** Exponents of metre, kilogram, second, ampere, kelvin, radian and square. */
export type Exponents = readonly [number, number, number, number, number, number, number];

export const BASE_NAMES = ["m", "kg", "s", "A", "K", "rad", "sq"] as const;

export interface Unit {
  readonly names: readonly string[];
  /** What it measures, for complaints: "a mass". */
  readonly noun: string;
  readonly exponents: Exponents;
  /** SI value = number·numerator/denominator·10^shift (+ offset/denominator), exactly; or number·factor where irrational. */
  readonly numerator?: bigint;
  readonly denominator?: bigint;
  readonly shift?: number;
  readonly factor?: number;
  /** Only for a scale whose zero is not the SI zero; the result is then in °C, the engine's temperature. */
  readonly offset?: bigint;
  readonly prefixes?: boolean;
}

/** SI prefixes and their powers of ten. Texts are NFKC-normalised first, which makes one of the two micro signs. */
export const PREFIXES: readonly (readonly [string, number])[] = [
  ["q", -30],
  ["r", -27],
  ["y", -24],
  ["z", -21],
  ["a", -18],
  ["f", -15],
  ["p", -12],
  ["n", -9],
  ["u", -6],
  ["μ", -6],
  ["m", -3],
  ["c", -2],
  ["d", -1],
  ["da", 1],
  ["h", 2],
  ["k", 3],
  ["M", 6],
  ["G", 9],
  ["T", 12],
  ["P", 15],
  ["E", 18],
  ["Z", 21],
  ["Y", 24],
  ["R", 27],
  ["Q", 30],
];

const LENGTH: Exponents = [1, 0, 0, 0, 0, 0, 0];
const TEMPERATURE: Exponents = [0, 0, 0, 0, 1, 0, 0];
const CONDUCTIVITY: Exponents = [-3, -1, 3, 2, 0, 0, 0];

export const UNITS: readonly Unit[] = [
  { names: ["m"], noun: "a length", exponents: LENGTH, prefixes: true },
  { names: ["in", "inch"], noun: "a length", exponents: LENGTH, numerator: 254n, shift: -4 },
  { names: ["mil", "mils", "thou"], noun: "a length", exponents: LENGTH, numerator: 254n, shift: -7 },
  { names: ["ft"], noun: "a length", exponents: LENGTH, numerator: 3048n, shift: -4 },
  { names: ["Å", "angstrom"], noun: "a length", exponents: LENGTH, shift: -10 },
  {
    names: ["cmil"],
    noun: "an area",
    exponents: [2, 0, 0, 0, 0, 0, 0],
    // A circular mil is the area of a circle one mil across (25.4 µm).
    factor: (Math.PI / 4) * 6.4516e-10,
  },
  { names: ["kcmil"], noun: "an area", exponents: [2, 0, 0, 0, 0, 0, 0], factor: (Math.PI / 4) * 6.4516e-7 },
  { names: ["rad"], noun: "an angle", exponents: [0, 0, 0, 0, 0, 1, 0], prefixes: true },
  { names: ["deg", "°"], noun: "an angle", exponents: [0, 0, 0, 0, 0, 1, 0], factor: Math.PI / 180 },
  { names: ["turn"], noun: "an angle", exponents: [0, 0, 0, 0, 0, 1, 0], factor: 2 * Math.PI },
  {
    names: ["K"],
    noun: "a temperature",
    exponents: TEMPERATURE,
    numerator: 100n,
    denominator: 100n,
    offset: -27315n,
    prefixes: true,
  },
  { names: ["degC", "°C"], noun: "a temperature", exponents: TEMPERATURE, denominator: 1n, offset: 0n },
  {
    names: ["degF", "°F"],
    noun: "a temperature",
    exponents: TEMPERATURE,
    numerator: 5n,
    denominator: 9n,
    offset: -160n,
  },
  {
    names: ["ohm", "ohms", "Ohm", "Ω"],
    noun: "a resistance",
    exponents: [2, 1, -3, -2, 0, 0, 0],
    prefixes: true,
  },
  { names: ["S"], noun: "a conductance", exponents: [-2, -1, 3, 2, 0, 0, 0], prefixes: true },
  {
    names: ["%IACS"],
    noun: "a conductivity",
    // The International Annealed Copper Standard is 58 MS/m at 20 °C (IEC 60028); one per cent of it is 0.58 MS/m.
    exponents: CONDUCTIVITY,
    numerator: 58n,
    shift: 4,
  },
  { names: ["sq", "square", "□"], noun: "a count of squares", exponents: [0, 0, 0, 0, 0, 0, 1] },
  { names: ["V"], noun: "a voltage", exponents: [2, 1, -3, -1, 0, 0, 0], prefixes: true },
  { names: ["A"], noun: "a current", exponents: [0, 0, 0, 1, 0, 0, 0], prefixes: true },
  { names: ["W"], noun: "a power", exponents: [2, 1, -3, 0, 0, 0, 0], prefixes: true },
  { names: ["%"], noun: "a plain number", exponents: [0, 0, 0, 0, 0, 0, 0], shift: -2 },
  { names: ["ppm"], noun: "a plain number", exponents: [0, 0, 0, 0, 0, 0, 0], shift: -6 },
  // Units that no input takes; they are known so that a complaint can say what they measure.
  { names: ["g"], noun: "a mass", exponents: [0, 1, 0, 0, 0, 0, 0], shift: -3, prefixes: true },
  { names: ["lb"], noun: "a mass", exponents: [0, 1, 0, 0, 0, 0, 0], numerator: 45359237n, shift: -8 },
  // Avoirdupois ounce: 1/16 lb.
  { names: ["oz"], noun: "a mass", exponents: [0, 1, 0, 0, 0, 0, 0], numerator: 28349523125n, shift: -12 },
  { names: ["s"], noun: "a time", exponents: [0, 0, 1, 0, 0, 0, 0], prefixes: true },
  { names: ["min"], noun: "a time", exponents: [0, 0, 1, 0, 0, 0, 0], numerator: 60n },
  { names: ["h"], noun: "a time", exponents: [0, 0, 1, 0, 0, 0, 0], numerator: 3600n },
  { names: ["N"], noun: "a force", exponents: [1, 1, -2, 0, 0, 0, 0], prefixes: true },
  { names: ["Pa"], noun: "a pressure", exponents: [-1, 1, -2, 0, 0, 0, 0], prefixes: true },
  { names: ["J"], noun: "an energy", exponents: [2, 1, -2, 0, 0, 0, 0], prefixes: true },
  { names: ["Hz"], noun: "a frequency", exponents: [0, 0, -1, 0, 0, 0, 0], prefixes: true },
  { names: ["F"], noun: "a capacitance", exponents: [-2, -1, 4, 2, 0, 0, 0], prefixes: true },
  { names: ["H"], noun: "an inductance", exponents: [2, 1, -2, -2, 0, 0, 0], prefixes: true },
  { names: ["C"], noun: "a charge", exponents: [0, 0, 1, 1, 0, 0, 0], prefixes: true },
  { names: ["L", "l"], noun: "a volume", exponents: [3, 0, 0, 0, 0, 0, 0], shift: -3, prefixes: true },
];
