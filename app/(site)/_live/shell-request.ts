/** The fields of the start page's calculation and the request they make. */
export interface ShellInput {
  readonly innerRadius: string;
  readonly outerRadius: string;
  readonly length: string;
  readonly conductivity: string;
}

export const SHELL_FIELDS = [
  { name: "innerRadius", label: "Inner radius", symbol: "a", pointer: "#/dimensions/innerRadius" },
  { name: "outerRadius", label: "Outer radius", symbol: "b", pointer: "#/dimensions/outerRadius" },
  { name: "length", label: "Length", symbol: "L", pointer: "#/dimensions/length" },
  { name: "conductivity", label: "Conductivity", symbol: "σ", pointer: "#/medium/conductivity" },
] as const;

/** An insulating sleeve, as the contract's own example has it. */
export const SHELL_START: ShellInput = {
  innerRadius: "2 mm",
  outerRadius: "5 mm",
  length: "1 m",
  conductivity: "1e-12 S/m",
};

export function shellRequest({ innerRadius, outerRadius, length, conductivity }: ShellInput) {
  return {
    shape: "cylindrical-shell",
    dimensions: { innerRadius, outerRadius, length },
    medium: { conductivity },
  };
}
