/** Materials as the console's JSON has them. */

export interface ListedMaterial {
  readonly id: string;
  readonly version: number;
  readonly name: string;
  readonly kind: string;
  readonly teamId: string | null;
  readonly teamName: string | null;
  readonly resistivityOhmM: number;
  readonly atC: number;
  readonly provenance: string;
  readonly retiredAt: string | null;
  readonly records: number;
}

export type Law = { readonly model: string } & Readonly<Record<string, unknown>>;

export interface MaterialVersion {
  readonly version: number;
  readonly name: string;
  readonly kind: string;
  readonly resistivity: Law;
  readonly range: { readonly from: number; readonly to: number };
  readonly uncertainty: { readonly lower: number; readonly upper: number; readonly note: string };
  readonly source: string;
  readonly provenance: string;
  readonly note?: string;
  readonly retiredAt: string | null;
  readonly madeAt: string | null;
  readonly madeBy: string | null;
  readonly curve: { readonly temperaturesC: readonly number[]; readonly resistivityOhmM: readonly number[] };
}

export interface MaterialHistory {
  readonly id: string;
  readonly teamId: string | null;
  readonly teamName: string | null;
  readonly versions: readonly MaterialVersion[];
  readonly uses: readonly { readonly version: number; readonly records: number }[];
  readonly mayManage: boolean;
}

export const KINDS = [
  "metal",
  "alloy",
  "solder",
  "carbon",
  "oxide",
  "semiconductor",
  "liquid",
  "soil",
  "building",
  "polymer",
  "other",
] as const;

export const PROVENANCES = ["measured", "source at hand", "from memory"] as const;

/** A resistivity with its unit: 17.2 nΩ·m. */
export function resistivityText(ohmM: number): string {
  const steps = [
    [1e12, "TΩ·m"],
    [1e9, "GΩ·m"],
    [1e6, "MΩ·m"],
    [1e3, "kΩ·m"],
    [1, "Ω·m"],
    [1e-3, "mΩ·m"],
    [1e-6, "µΩ·m"],
    [1e-9, "nΩ·m"],
  ] as const;
  const [factor, unit] = steps.find(([each]) => ohmM >= each) ?? [1e-9, "nΩ·m"];
  const value = ohmM / factor;
  return `${value >= 1e4 || value < 1e-3 ? value.toExponential(3) : Number(value.toPrecision(4))} ${unit}`;
}

/** Each member of a version as a line of text, for what differs between two. */
export function factsOf(version: MaterialVersion): readonly (readonly [string, string])[] {
  const { resistivity, range, uncertainty } = version;
  const { model, ...law } = resistivity;
  const units: Readonly<Record<string, string>> = {
    resistivity: "Ω·m",
    coefficient: "1/K",
    reference: "°C",
    density: "1/cm³",
    temperatures: "°C",
    values: law.quantity === "conductivity" ? "S/m" : "Ω·m",
    // Of the powers of the temperature: the first has this unit, the next ones per K, per K² …
    coefficients: law.quantity === "conductivity" ? "S/m, S/(m·K), …" : "Ω·m, Ω·m/K, …",
  };
  const plain = (name: string, value: unknown) => {
    const text = Array.isArray(value)
      ? `${value.length} values: ${value.slice(0, 6).join(", ")}${value.length > 6 ? " …" : ""}`
      : String(value);
    return units[name] ? `${text} ${units[name]}` : text;
  };
  return [
    ["Name", version.name],
    ["Kind", version.kind],
    ["Law", model],
    ...Object.entries(law).map(([name, value]) => [`Law: ${name}`, plain(name, value)] as const),
    ["Holds", `${range.from} °C to ${range.to} °C`],
    ["Uncertainty", `${uncertainty.lower} to ${uncertainty.upper} times; ${uncertainty.note}`],
    ["Source", version.source],
    ["Provenance", version.provenance],
    ["Note", version.note ?? ""],
  ];
}
