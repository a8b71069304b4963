/** The fields of each kind of profile, for the editor and for the address; the kinds and their laws are the engine's. */
export type ProfileField =
  | {
      readonly name: string;
      readonly label: string;
      readonly type: "value" | "position" | "number" | "temperature" | "density" | "material" | "expression";
      readonly optional?: true;
      readonly help?: string;
    }
  | {
      readonly name: string;
      readonly label: string;
      readonly type: "choice";
      readonly choices: readonly { readonly value: string; readonly label: string }[];
    }
  | { readonly name: string; readonly label: string; readonly type: "flag" }
  | { readonly name: "layers"; readonly label: string; readonly type: "layers" }
  | { readonly name: "table"; readonly label: string; readonly type: "table" }
  | { readonly name: "profile"; readonly label: string; readonly type: "profile" };

const INTERPOLATIONS = [
  { value: "linear", label: "Straight lines" },
  { value: "log", label: "Straight in the logarithm" },
  { value: "monotone-cubic", label: "Monotone cubic" },
] as const;

const background: ProfileField = {
  name: "background",
  label: "Background",
  type: "value",
  optional: true,
  help: "The value far away; 0 where it is left empty.",
};

export const PROFILE_FORMS: Readonly<Record<string, readonly ProfileField[]>> = {
  constant: [{ name: "value", label: "Value", type: "value" }],
  linear: [
    { name: "from", label: "At the start", type: "value" },
    { name: "to", label: "At the end", type: "value" },
  ],
  exponential: [
    { name: "from", label: "At the start", type: "value" },
    { name: "to", label: "At the end", type: "value" },
  ],
  power: [
    { name: "reference", label: "Reference value", type: "value" },
    { name: "at", label: "At the position", type: "position" },
    { name: "exponent", label: "Exponent", type: "number" },
  ],
  gaussian: [
    { name: "peak", label: "Value at the centre", type: "value" },
    { name: "center", label: "Centre", type: "position" },
    { name: "spread", label: "Standard deviation", type: "position" },
    background,
  ],
  "complementary-error": [
    { name: "surface", label: "Value at the surface", type: "value" },
    { name: "length", label: "Diffusion length", type: "position" },
    {
      name: "from",
      label: "The surface is the coordinate's",
      type: "choice",
      choices: [
        { value: "start", label: "start" },
        { value: "end", label: "end" },
      ],
    },
    background,
  ],
  layers: [{ name: "layers", label: "Layers", type: "layers" }],
  table: [
    { name: "table", label: "Points", type: "table" },
    { name: "interpolation", label: "Between the points", type: "choice", choices: INTERPOLATIONS },
  ],
  expression: [
    {
      name: "value",
      label: "Expression",
      type: "expression",
      help: "In s, the position in SI (metres or radians), and u, which runs from 0 to 1; the outcome in SI.",
    },
  ],
  temperature: [
    { name: "material", label: "Material", type: "material" },
    { name: "from", label: "Temperature at the start", type: "temperature" },
    { name: "to", label: "Temperature at the end", type: "temperature" },
    { name: "extrapolate", label: "Allow temperatures outside the material's range", type: "flag" },
  ],
  dopant: [
    {
      name: "type",
      label: "Dopant",
      type: "choice",
      choices: [
        { value: "n", label: "donors (n)" },
        { value: "p", label: "acceptors (p)" },
      ],
    },
    { name: "profile", label: "Dopant density", type: "profile" },
    {
      name: "model",
      label: "Conductivity by",
      type: "choice",
      choices: [
        { value: "f723", label: "ASTM F723" },
        { value: "masetti", label: "Masetti 1983" },
      ],
    },
    {
      name: "background",
      label: "Density of the other type",
      type: "density",
      optional: true,
      help: "All over, and less than the dopant everywhere; for the model of Masetti only. 0 where it is left empty.",
    },
  ],
};

/** Kinds whose values say themselves what they are. */
export const SELF_DESCRIBING = new Set(["temperature", "dopant"]);

/** Rows of two columns in one text: "0.1mm:58MS/m,0.2mm:10MS/m". */
export function readRows(text: string): readonly (readonly [string, string])[] {
  if (text === "") return [];
  return text.split(",").map((row) => {
    const cut = row.indexOf(":");
    return cut < 0 ? [row.trim(), ""] : [row.slice(0, cut).trim(), row.slice(cut + 1).trim()];
  });
}

/** The inverse; commas and colons inside a cell, which no quantity has, become spaces. */
export function writeRows(rows: readonly (readonly [string, string])[]): string {
  return rows.map((row) => row.map((cell) => cell.replace(/[,:]/g, " ")).join(":")).join(",");
}
