/** What a quantity can measure, and what a bare number then means. */
import type { Exponents } from "./unit-table";

export interface QuantityKind {
  /** "a length" */
  readonly noun: string;
  readonly exponents: Exponents;
  /** Further exponents accepted alike (a sheet resistance in plain ohms). */
  readonly also?: readonly Exponents[];
  /** Unit of a bare number, and of the value that `parseQuantity` returns unless `canonical` says otherwise. */
  readonly unit: string;
  /** Value returned = SI value·10^shift. */
  readonly shift?: number;
  /** A bare number is in degrees, the value in radians. */
  readonly degrees?: boolean;
  /** Temperatures have a zero of their own; `absolute` values come back in °C. */
  readonly temperature?: "absolute" | "difference";
  /** Spellings shown in complaints. */
  readonly examples: string;
}

const kinds = {
  length: {
    noun: "a length",
    exponents: [1, 0, 0, 0, 0, 0, 0],
    unit: "m",
    examples: '0.00025, "0.25 mm", "10 mil"',
  },
  area: {
    noun: "an area",
    exponents: [2, 0, 0, 0, 0, 0, 0],
    unit: "m^2",
    examples: '1e-6, "1 mm^2", "250 kcmil"',
  },
  angle: {
    noun: "an angle",
    exponents: [0, 0, 0, 0, 0, 1, 0],
    unit: "deg",
    degrees: true,
    examples: '90 (degrees), "90 deg", "1.57 rad"',
  },
  temperature: {
    noun: "a temperature",
    exponents: [0, 0, 0, 0, 1, 0, 0],
    unit: "degC",
    temperature: "absolute",
    examples: '75 (°C), "75 degC", "348.15 K"',
  },
  temperatureDifference: {
    noun: "a temperature difference",
    exponents: [0, 0, 0, 0, 1, 0, 0],
    unit: "K",
    temperature: "difference",
    examples: '5, "5 K", "9 degF"',
  },
  temperatureCoefficient: {
    noun: "a temperature coefficient",
    exponents: [0, 0, 0, 0, -1, 0, 0],
    unit: "1/K",
    temperature: "difference",
    examples: '0.00393, "0.393 %/K", "50 ppm/K"',
  },
  resistivity: {
    noun: "a resistivity",
    exponents: [3, 1, -3, -2, 0, 0, 0],
    unit: "ohm m",
    examples: '1.72e-8, "1.72e-8 ohm m", "0.0172 ohm mm^2/m"',
  },
  conductivity: {
    noun: "a conductivity",
    exponents: [-3, -1, 3, 2, 0, 0, 0],
    unit: "S/m",
    examples: '58e6, "58 MS/m", "61 %IACS"',
  },
  sheetResistance: {
    noun: "a sheet resistance",
    exponents: [2, 1, -3, -2, 0, 0, -1],
    also: [[2, 1, -3, -2, 0, 0, 0]],
    unit: "ohm/sq",
    examples: '50, "50 ohm/sq", "0.5 mohm/sq"',
  },
  resistance: {
    noun: "a resistance",
    exponents: [2, 1, -3, -2, 0, 0, 0],
    unit: "ohm",
    examples: '0.005, "5 mohm", "2.2 kΩ"',
  },
  voltage: {
    noun: "a voltage",
    exponents: [2, 1, -3, -1, 0, 0, 0],
    unit: "V",
    examples: '500, "500 V", "12 mV"',
  },
  current: {
    noun: "a current",
    exponents: [0, 0, 0, 1, 0, 0, 0],
    unit: "A",
    examples: '630, "630 A", "20 mA"',
  },
  power: {
    noun: "a power",
    exponents: [2, 1, -3, 0, 0, 0, 0],
    unit: "W",
    examples: '1.5, "1.5 W", "250 mW"',
  },
  density: {
    noun: "a dopant density",
    exponents: [-3, 0, 0, 0, 0, 0, 0],
    unit: "1/cm^3",
    shift: -6,
    examples: '1e18 (1/cm³), "1e18 1/cm^3", "1e24 1/m^3"',
  },
  number: { noun: "a plain number", exponents: [0, 0, 0, 0, 0, 0, 0], unit: "1", examples: "1.02" },
} as const satisfies Record<string, QuantityKind>;

export type QuantityKindName = keyof typeof kinds;

export const QUANTITY_KINDS: Readonly<Record<QuantityKindName, QuantityKind>> = kinds;
