/** The medium of a request, and the materials that went in. */
import type { Material, QuantityKindName, ShapeEntry } from "@/lib/engine";
import { PROVENANCE } from "../../calculate/_calculator/answer/words";
import { PROFILE_FORMS } from "../../calculate/_model/profile-forms";
import type { Block, Column, Fact } from "./content";
import { plainNumber, siText, typedText, words } from "./typed";

type Given = Readonly<Record<string, unknown>>;

const KINDS: Readonly<Record<string, QuantityKindName>> = {
  resistivity: "resistivity",
  conductivity: "conductivity",
  sheetResistance: "sheetResistance",
  thickness: "length",
  temperatureCoefficient: "temperatureCoefficient",
  referenceTemperature: "temperature",
};

/** Rows of a table of inputs: what, as typed, in SI. */
export type InputRow = readonly [string, string, string];

export const INPUT_COLUMNS: readonly Column[] = [
  { title: "Input", weight: 1.3 },
  { title: "As typed", numeric: true, weight: 1.1 },
  { title: "In SI", numeric: true, weight: 1.1 },
];

/** The medium or media of a request: the plain members as rows, a grading by its kind, layers and points as tables. */
export function mediumBlocks(
  medium: Given | undefined,
  media: Readonly<Record<string, Given>> | undefined,
  entry?: Pick<ShapeEntry, "media" | "coordinates">,
): Block[] {
  const all: (readonly [string, Given])[] = media
    ? Object.entries(media).map(([name, given]) => [
        entry?.media.names.find((medium) => medium.name === name)?.label ?? words(name),
        given,
      ])
    : medium
      ? [["", medium]]
      : [];
  const rows: InputRow[] = [];
  const behind: Block[] = [];
  for (const [label, given] of all) {
    const prefix = label === "" ? "" : `${label}: `;
    for (const [name, value] of Object.entries(given)) {
      if (name === "graded") gradedRows(prefix, value as Given, entry, rows, behind);
      else if (name === "regions") regionRows(value as readonly Given[], rows);
      else rows.push(plainRow(prefix, name, value));
    }
  }
  if (rows.length === 0) return [];
  return [{ kind: "table", label: "Medium", columns: INPUT_COLUMNS, rows }, ...behind];
}

function plainRow(prefix: string, name: string, value: unknown): InputRow {
  const kind = KINDS[name];
  const title = sentenceCase(prefix, words(name));
  return [title, typedText(value, kind), kind ? siText(value, kind) : ""];
}

function sentenceCase(prefix: string, name: string): string {
  return prefix === "" ? name : `${prefix}${name.charAt(0).toLowerCase()}${name.slice(1)}`;
}

function gradedRows(
  prefix: string,
  graded: Given,
  entry: Pick<ShapeEntry, "coordinates"> | undefined,
  rows: InputRow[],
  behind: Block[],
): void {
  const profile = (graded.profile ?? {}) as Given;
  const quantity = graded.quantity === "resistivity" ? "resistivity" : "conductivity";
  const coordinate = String(graded.coordinate ?? "");
  const angle = entry?.coordinates.find(({ name }) => name === coordinate)?.unit === "rad";
  rows.push([sentenceCase(prefix, "Varies along"), words(coordinate).toLowerCase(), ""]);
  if (graded.quantity !== undefined) rows.push([sentenceCase(prefix, "What varies"), quantity, ""]);
  profileRows(prefix, profile, { value: quantity, position: angle ? "angle" : "length" }, rows, behind);
}

interface ProfileKinds {
  readonly value: QuantityKindName;
  readonly position: QuantityKindName;
}

function profileRows(
  prefix: string,
  profile: Given,
  kinds: ProfileKinds,
  rows: InputRow[],
  behind: Block[],
): void {
  const kind = String(profile.kind);
  rows.push([sentenceCase(prefix, "Profile"), words(kind).toLowerCase(), ""]);
  if (Array.isArray(profile.layers)) behind.push(layersTable(profile.layers as readonly Given[], kinds));
  if (Array.isArray(profile.positions) && Array.isArray(profile.values)) {
    behind.push(pointsTable(profile.positions, profile.values, kinds));
  }
  for (const [name, value] of Object.entries(profile)) {
    if (name === "kind" || name === "layers" || name === "positions" || name === "values") continue;
    if (name === "profile") {
      profileRows(`${prefix}Dopant density: `, value as Given, { ...kinds, value: "density" }, rows, behind);
      continue;
    }
    const form = (PROFILE_FORMS[kind] ?? []).find((field) => field.name === name);
    const unit =
      form?.type === "temperature"
        ? "temperature"
        : form?.type === "value" || form?.type === "position"
          ? kinds[form.type]
          : undefined;
    const title = sentenceCase(prefix, form?.label ?? words(name));
    rows.push([title, typedText(value, unit), unit ? siText(value, unit) : ""]);
  }
}

/** Rows of layers or regions that a sheet of paper takes; the stored request has them all. */
const MOST_ROWS = 120;

function layersTable(layers: readonly Given[], { value: kind, position }: ProfileKinds): Block {
  return {
    kind: "table",
    label: "Layers",
    ...(layers.length > MOST_ROWS
      ? { remark: `The first ${MOST_ROWS} of ${layers.length} layers; the stored request has them all.` }
      : {}),
    columns: [
      { title: "Layer", weight: 0.4 },
      { title: "Thickness", numeric: true },
      { title: words(kind), numeric: true },
      { title: `${words(kind)} in SI`, numeric: true },
    ],
    rows: layers
      .slice(0, MOST_ROWS)
      .map(({ thickness, value }, index) => [
        String(index + 1),
        typedText(thickness, position),
        typedText(value, kind),
        siText(value, kind),
      ]),
  };
}

/** A measured table may be long; the record's request has all of it. */
const MOST_POINTS = 60;

function pointsTable(
  positions: readonly unknown[],
  values: readonly unknown[],
  { value: kind, position }: ProfileKinds,
): Block {
  const step = Math.ceil(positions.length / MOST_POINTS);
  const shown = positions
    .map((_, index) => index)
    .filter((index) => index % step === 0 || index === positions.length - 1);
  return {
    kind: "table",
    label: "Points",
    ...(step === 1
      ? {}
      : { remark: `${shown.length} of ${positions.length} points; the stored request has them all.` }),
    columns: [
      { title: "Point", weight: 0.4 },
      { title: "Position", numeric: true },
      { title: words(kind), numeric: true },
      { title: `${words(kind)} in SI`, numeric: true },
    ],
    rows: shown.map((index) => [
      String(index + 1),
      typedText(positions[index], position),
      typedText(values[index], kind),
      siText(values[index], kind),
    ]),
  };
}

function regionRows(regions: readonly Given[], rows: InputRow[]): void {
  regions.slice(0, MOST_ROWS).forEach((region, index) => {
    for (const [name, value] of Object.entries((region.medium ?? {}) as Given)) {
      rows.push(plainRow(`Region ${index + 1}: `, name, value));
    }
  });
  if (regions.length > MOST_ROWS) rows.push(["Further regions", String(regions.length - MOST_ROWS), ""]);
}

/** Where the materials' numbers come from, each at the version that was used. */
export function materialBlocks(
  used: readonly { readonly id: string; readonly version: number; readonly name?: string }[],
  lookUp: (id: string, version: number) => Material | undefined,
): Block[] {
  return used.map(({ id, version, name }): Block => {
    const material = lookUp(id, version);
    const facts: Fact[] = [
      { name: "Material", value: material?.name ?? name ?? id, note: `${id}, version ${version}` },
    ];
    if (!material) {
      facts.push({ name: "Source", value: "This version is no longer kept." });
      return { kind: "facts", facts };
    }
    const { lower, upper, note } = material.uncertainty;
    const { from, to } = material.range;
    facts.push(
      { name: "Range", value: from === to ? `at ${degrees(from)}` : `${degrees(from)} to ${degrees(to)}` },
      {
        name: "True resistivity",
        value: `${plainNumber(lower)} to ${plainNumber(upper)} times the nominal one`,
        ...(note ? { note } : {}),
      },
      {
        name: "Source",
        value: material.source,
        note: PROVENANCE[material.provenance] ?? material.provenance,
      },
    );
    return { kind: "facts", facts };
  });
}

function degrees(value: number): string {
  return `${plainNumber(value)}\u2009°C`;
}
