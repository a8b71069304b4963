import { docstring, literal, pascalCase, snakeCase } from "./names";

/** What the OpenAPI document says of a value, as far as a reader of answers needs it. */
export interface Schema {
  readonly $ref?: string;
  readonly type?: string | readonly string[];
  readonly enum?: readonly unknown[];
  readonly const?: unknown;
  readonly properties?: Readonly<Record<string, Schema>>;
  readonly required?: readonly string[];
  readonly items?: Schema;
  readonly prefixItems?: readonly Schema[];
  readonly anyOf?: readonly Schema[];
  readonly oneOf?: readonly Schema[];
  readonly allOf?: readonly Schema[];
  readonly additionalProperties?: boolean | Schema;
  readonly description?: string;
}

/** How a value is annotated in Python, and how `_read` makes it ("None" leaves it as it is). */
interface Reading {
  readonly annotation: string;
  readonly spec: string;
  readonly nullable: boolean;
}

interface Member {
  readonly name: string;
  readonly json: string;
  readonly required: boolean;
  readonly reading: Reading;
  readonly description: string;
}

const SCALARS: Readonly<Record<string, string>> = {
  string: "str",
  number: "float",
  integer: "int",
  boolean: "bool",
};

/** Makes a dataclass of every object that an answer holds; equal objects share one. */
export class AnswerClasses {
  private readonly texts = new Map<string, string>();
  private readonly byStructure = new Map<string, string>();
  private readonly named = new Map<string, string>();

  constructor(private readonly schemas: Readonly<Record<string, Schema>>) {}

  /** How an answer of that schema is read; classes it needs come into being. */
  reading(schema: Schema, name: string): Reading {
    if (schema.$ref) return this.referenced(schema.$ref);
    const choices = schema.anyOf ?? schema.oneOf;
    if (choices) return this.choice(choices, name);
    const types = (Array.isArray(schema.type) ? schema.type : [schema.type]).filter(
      (type): type is string => typeof type === "string",
    );
    const nullable = types.includes("null");
    const kinds = types.filter((type) => type !== "null");
    if (kinds.length !== 1) return { annotation: "Any", spec: "None", nullable };
    const [kind] = kinds;
    if (kind === "array") {
      if (schema.prefixItems) return { annotation: "List[Any]", spec: "None", nullable };
      const inner = this.reading(schema.items ?? {}, name.replace(/s$/, ""));
      const annotation = `List[${inner.nullable ? `Optional[${inner.annotation}]` : inner.annotation}]`;
      return { annotation, spec: inner.spec === "None" ? "None" : `("list", ${inner.spec})`, nullable };
    }
    if (kind !== "object") return { annotation: SCALARS[kind] ?? "Any", spec: "None", nullable };
    if (!schema.properties) return { annotation: "Dict[str, Any]", spec: "None", nullable };
    const made = this.define(schema, name);
    return { annotation: made, spec: literal(made), nullable };
  }

  /** The classes as source, each after those it mentions. */
  source(): string {
    return [...this.texts.values()].join("\n\n");
  }

  names(): string[] {
    return [...this.texts.keys()];
  }

  private referenced(ref: string): Reading {
    const name = ref.split("/").at(-1) ?? "";
    const known = this.named.get(name);
    if (known) return { annotation: known, spec: literal(known), nullable: false };
    const schema = this.schemas[name];
    if (!schema) throw new Error(`The document has no schema ${name}.`);
    const reading = this.reading(schema, name);
    if (reading.spec === literal(reading.annotation)) this.named.set(name, reading.annotation);
    return reading;
  }

  private choice(choices: readonly Schema[], name: string): Reading {
    const nullable = choices.some(({ type }) => type === "null");
    const real = choices.filter(({ type }) => type !== "null");
    const readings = real.map((schema, index) =>
      this.reading(schema, real.length > 1 && index > 0 ? `${name}${index + 1}` : name),
    );
    const annotations = [...new Set(readings.map(({ annotation }) => annotation))];
    const classes = readings.filter(({ spec }) => spec.startsWith('"'));
    const names = [...new Set(classes.map(({ spec }) => spec))];
    const annotation = annotations.length === 1 ? annotations[0] : `Union[${annotations.join(", ")}]`;
    const anyNull = nullable || readings.some((reading) => reading.nullable);
    if (names.length === 0) return { annotation, spec: readings[0]?.spec ?? "None", nullable: anyNull };
    if (names.length === 1 && readings.length === classes.length)
      return { annotation, spec: names[0], nullable: anyNull };
    return { annotation, spec: `("any", (${names.join(", ")},))`, nullable: anyNull };
  }

  private define(schema: Schema, wanted: string): string {
    const structure = JSON.stringify(schema);
    const known = this.byStructure.get(structure);
    if (known) return known;
    let name = pascalCase(wanted);
    for (let count = 2; [...this.byStructure.values()].includes(name); count += 1)
      name = `${pascalCase(wanted)}${count}`;
    this.byStructure.set(structure, name);
    const members = Object.entries(schema.properties ?? {}).map(([json, value]): Member => ({
      name: snakeCase(json),
      json,
      required: schema.required?.includes(json) ?? false,
      reading: this.reading(value, `${name}${pascalCase(json)}`),
      description: value.description ?? "",
    }));
    this.texts.set(name, classText(name, schema, members));
    return name;
  }
}

function classText(name: string, schema: Schema, members: readonly Member[]): string {
  const ordered = [...members].sort((a, b) => Number(b.required) - Number(a.required));
  const names = members.filter((member) => member.name !== member.json);
  const specs = members.filter(({ reading }) => reading.spec !== "None");
  const fixed = Object.entries(schema.properties ?? {}).flatMap(([json, value]) => {
    const allowed = value.enum ?? (value.const === undefined ? undefined : [value.const]);
    const texts = allowed?.filter((entry) => typeof entry === "string" || typeof entry === "number");
    // Only what has a single value tells kinds apart: further values of an enumeration are compatible additions.
    return schema.required?.includes(json) && texts?.length === 1 && allowed?.length === 1
      ? [`${literal(json)}: ${JSON.stringify(texts[0])}`]
      : [];
  });
  const dictionary = (entries: readonly string[]) => `{${entries.join(", ")}}`;
  const required = (schema.required ?? []).map(literal);
  const lines = [
    `    _NAMES: ClassVar[Mapping[str, str]] = ${dictionary(names.map((m) => `${literal(m.name)}: ${literal(m.json)}`))}`,
    `    _SPECS: ClassVar[Mapping[str, _Spec]] = ${dictionary(specs.map((m) => `${literal(m.name)}: ${m.reading.spec}`))}`,
    `    _REQUIRED: ClassVar[Tuple[str, ...]] = (${required.join(", ")}${required.length === 1 ? "," : ""})`,
    `    _FIXED: ClassVar[Mapping[str, Any]] = ${dictionary(fixed)}`,
  ];
  const fields = ordered.flatMap(({ name: field, required: needed, reading, description }) => {
    const optional = !needed || reading.nullable;
    const annotation = optional ? `Optional[${reading.annotation}]` : reading.annotation;
    const comment = description.replace(/\s+/g, " ").trim();
    return [
      ...(comment ? [`    #: ${comment}`] : []),
      `    ${field}: ${annotation}${needed ? "" : " = None"}`,
    ];
  });
  const doc = docstring(schema.description ?? `Part of an answer.`, "    ");
  return `@dataclass(frozen=True)\nclass ${name}:\n${doc}\n${lines.join("\n")}\n${fields.join("\n")}\n`;
}
