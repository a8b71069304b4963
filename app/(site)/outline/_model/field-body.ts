/** The body of `POST /fields` that a sketch stands for. */
import { mediumKindOf } from "./medium";
import type { Parameters, Part, Ring, Sketch, Vertex } from "./sketch";

const OPERATING = ["temperature", "voltage", "current", "power"] as const;
const REQUIREMENT = ["min", "max"] as const;
const WITH_COEFFICIENT = ["resistivity", "conductivity"];

type Element =
  | readonly [number, number]
  | {
      readonly arcTo: readonly [number, number];
      readonly center: readonly [number, number];
      readonly clockwise: boolean;
    };

/** Members in the contract's order; what is not given is left out, so that the API says what is missing. */
export interface FieldBody {
  readonly outline: {
    readonly unit: string;
    readonly outer: readonly Element[];
    readonly holes?: readonly (readonly Element[])[];
    readonly symmetry?: "axisymmetric";
  };
  readonly terminals: readonly object[];
  readonly medium: Readonly<Record<string, unknown>>;
  readonly accuracy: number;
  readonly operating?: Readonly<Record<string, string>>;
  readonly requirement?: Readonly<Record<string, string>>;
}

export function fieldBody(sketch: Sketch): FieldBody {
  const [outer, ...holes] = sketch.rings.map((ring) => ring.map(element));
  const axisymmetric = sketch.symmetry === "axisymmetric";
  return {
    outline: {
      unit: sketch.unit,
      outer,
      ...(holes.length > 0 ? { holes } : {}),
      ...(axisymmetric ? { symmetry: "axisymmetric" as const } : {}),
    },
    terminals: sketch.terminals.map(({ name, parts, segments }) => ({
      name,
      ...(segments.length > 0 ? { segments } : {}),
      ...(parts.length > 0 || segments.length === 0 ? { parts: parts.map(partBody) } : {}),
    })),
    medium: {
      ...mediumBody(sketch.medium, axisymmetric),
      ...(sketch.regions.length > 0
        ? {
            regions: sketch.regions.map(({ ring, medium }) => ({
              ring: corners(ring),
              medium: mediumBody(medium, axisymmetric),
            })),
          }
        : {}),
    },
    accuracy: sketch.accuracy,
    ...group("operating", OPERATING, sketch.settings),
    ...group("requirement", REQUIREMENT, sketch.settings),
  };
}

function element({ x, y, arc }: Vertex): Element {
  return arc ? { arcTo: [x, y], center: [arc.x, arc.y], clockwise: arc.clockwise } : [x, y];
}

function corners(ring: Ring): readonly (readonly [number, number])[] {
  return ring.map(({ x, y }) => [x, y]);
}

function partBody({ ring, edge, from, to }: Part): object {
  return { ring, edge, ...(from === 0 ? {} : { from }), ...(to === 1 ? {} : { to }) };
}

/** An emptied field is still the chosen one: the API then asks for a value rather than for a choice. */
function mediumBody(medium: Parameters, axisymmetric: boolean): Readonly<Record<string, unknown>> {
  const kind = mediumKindOf(medium);
  if (!kind) return {};
  const body: Record<string, unknown> = { [kind]: medium[kind].trim() };
  const put = (name: string): void => {
    const text = medium[name]?.trim();
    if (text) body[name] = text;
  };
  if (WITH_COEFFICIENT.includes(kind)) ["temperatureCoefficient", "referenceTemperature"].forEach(put);
  if (kind === "material" && medium.extrapolate === "true") body.extrapolate = true;
  if (kind === "expression") body.quantity = medium.quantity || "conductivity";
  if (kind !== "sheetResistance" && !axisymmetric) put("thickness");
  return body;
}

function group(name: string, members: readonly string[], settings: Parameters): object {
  const given = members.filter((member) => settings[member]?.trim());
  if (given.length === 0) return {};
  return { [name]: Object.fromEntries(given.map((member) => [member, settings[member].trim()])) };
}
