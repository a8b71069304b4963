import type { DimensionEntry, ShapeEntry } from "@/lib/engine";
import { docstring, literal, pascalCase, snakeCase } from "./names";

/** A dataclass for each shape of the catalogue: its dimensions by name, those that may be left out with None. */
export function shapeClasses(entries: readonly ShapeEntry[]): string {
  const base = [
    "class _Shape:",
    '    """A shape of the catalogue with its dimensions."""',
    "",
    "    SHAPE: ClassVar[str]",
    "    _NAMES: ClassVar[Mapping[str, str]]",
    "",
  ].join("\n");
  return [base, ...entries.map(shapeClass)].join("\n\n");
}

/** Names of the classes that `shapeClasses` makes. */
export function shapeClassName(id: string): string {
  return pascalCase(id);
}

function shapeClass(entry: ShapeEntry): string {
  const alternatives = new Set(entry.alternatives.flat());
  const needed = (dimension: DimensionEntry) => dimension.required && !alternatives.has(dimension.name);
  const ordered = [...entry.dimensions].sort((a, b) => Number(needed(b)) - Number(needed(a)));
  const names = entry.dimensions
    .filter(({ name }) => snakeCase(name) !== name)
    .map(({ name }) => `${literal(snakeCase(name))}: ${literal(name)}`);
  const groups = entry.alternatives.map((group) => group.map(snakeCase).join(" or "));
  const about = [`${entry.title}. ${entry.summary}`, ...groups.map((group) => `Exactly one of ${group}.`)];
  const fields = ordered.flatMap((dimension) => [
    `    #: ${describe(dimension)}`,
    `    ${snakeCase(dimension.name)}: ${needed(dimension) ? kindOf(dimension) : `Optional[${kindOf(dimension)}] = None`}`,
  ]);
  return [
    "@dataclass(frozen=True)",
    `class ${shapeClassName(entry.id)}(_Shape):`,
    docstring(about.join(" "), "    "),
    `    SHAPE: ClassVar[str] = ${literal(entry.id)}`,
    `    _NAMES: ClassVar[Mapping[str, str]] = {${names.join(", ")}}`,
    ...fields,
    "",
  ].join("\n");
}

function kindOf({ type, unit }: DimensionEntry): string {
  if (type === "choice") return "str";
  if (type === "integer") return "int";
  return unit === "1" ? "float" : "Quantity";
}

function describe({ label, unit, choices, help }: DimensionEntry): string {
  const what = choices ? choices.map(({ value }) => literal(value)).join(", ") : unit === "1" ? "" : unit;
  return [`${label}${what ? ` (${what})` : ""}.`, help.replace(/\s+/g, " ")].join(" ").trim();
}
