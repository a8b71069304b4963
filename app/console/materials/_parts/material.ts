/** Materials as the console's JSON has them. */

export type { ListedMaterial } from "@/lib/materials/console-materials";

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
