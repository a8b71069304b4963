/** Reads an outline of the API, or the whole body of a field solution, into a sketch, with a complaint at each place. */
import { LENGTH_UNITS_M, type LengthUnit } from "@/lib/engine/field/outline/length-units";
import { MEDIUM_KINDS, MEDIUM_MEMBERS } from "./medium";
import type { Parameters, Part, Point, Region, Ring, Sketch, Terminal, Vertex } from "./sketch";
import { partOfSegment } from "./terminals";

export interface BodyComplaint {
  readonly pointer: string;
  readonly detail: string;
}

export type BodyReading =
  | { readonly ok: true; readonly sketch: Sketch; readonly holds: "outline" | "field" }
  | { readonly ok: false; readonly complaints: readonly BodyComplaint[] };

const MOST_COMPLAINTS = 20;

const BODY_MEMBERS = ["outline", "terminals", "medium", "accuracy", "operating", "requirement", "record"];
/** What the answer to `POST /outlines` says beside the outline and its terminals. */
const STORED_FACTS = ["id", "name", "createdAt", "repairs", "regions"];
const OUTLINE_MEMBERS = ["unit", "outer", "holes", "symmetry"];
export const DEFAULT_ACCURACY = 1e-4;

/** Text of a file or a paste. `around` gives the medium and settings where the text is an outline alone. */
export function readBodyText(text: string, around: Sketch): BodyReading {
  let json: unknown;
  try {
    json = JSON.parse(text);
  } catch (error) {
    const why = error instanceof Error ? error.message : "it cannot be read";
    return { ok: false, complaints: [{ pointer: "#", detail: `is not JSON: ${why}.` }] };
  }
  return readBody(json, around);
}

export function readBody(json: unknown, around: Sketch): BodyReading {
  const reader = new Reader();
  const sketch = reader.body(json, around);
  if (reader.complaints.length > 0 || sketch === null) {
    return { ok: false, complaints: reader.complaints.slice(0, MOST_COMPLAINTS) };
  }
  return { ok: true, sketch, holds: isRecord(json) && "medium" in json ? "field" : "outline" };
}

type Json = Readonly<Record<string, unknown>>;

function isRecord(value: unknown): value is Json {
  return typeof value === "object" && value !== null && !Array.isArray(value);
}

class Reader {
  readonly complaints: BodyComplaint[] = [];

  private complain(pointer: string, detail: string): null {
    this.complaints.push({ pointer, detail });
    return null;
  }

  body(json: unknown, around: Sketch): Sketch | null {
    if (!isRecord(json)) return this.complain("#", "must be an object: an outline, or the body of a field.");
    if ("outer" in json) {
      const { terminals, ...outline } = json;
      return this.whole({ outline, ...(terminals === undefined ? {} : { terminals }) }, "#", around);
    }
    if (json.outline === undefined && json.outlineId !== undefined) {
      return this.complain("#/outlineId", "is not read here: paste the outline itself.");
    }
    if (json.outline === undefined) return this.complain("#/outline", "is required.");
    this.only(json, BODY_MEMBERS, "#", STORED_FACTS);
    if (Array.isArray(json.regions) && json.regions.length > 0) {
      this.complain("#/regions", "have no medium: write each as { ring, medium } into medium/regions.");
    }
    return this.whole(json, "#/outline", around);
  }

  private whole(json: Json, at: string, around: Sketch): Sketch | null {
    const { outline } = json;
    if (!isRecord(outline)) return this.complain(at, "must be an object with `outer`.");
    this.only(outline, OUTLINE_MEMBERS, at);
    const unit = outline.unit ?? "m";
    if (typeof unit !== "string" || !(unit in LENGTH_UNITS_M)) {
      this.complain(`${at}/unit`, `must be one of ${Object.keys(LENGTH_UNITS_M).join(", ")}.`);
    }
    const symmetry = outline.symmetry ?? "plan";
    if (symmetry !== "plan" && symmetry !== "axisymmetric") {
      this.complain(`${at}/symmetry`, "must be plan or axisymmetric.");
    }
    const outer = this.ring(outline.outer, `${at}/outer`);
    const holes = this.list(outline.holes ?? [], `${at}/holes`, (hole, pointer) => this.ring(hole, pointer));
    const rings = [outer, ...holes];
    const terminals = this.list(json.terminals ?? [], "#/terminals", (terminal, pointer) =>
      this.terminal(terminal, pointer, rings),
    );
    const medium = json.medium === undefined ? null : this.medium(json.medium, "#/medium", true);
    const accuracy = json.accuracy ?? (json.medium === undefined ? around.accuracy : DEFAULT_ACCURACY);
    if (typeof accuracy !== "number") this.complain("#/accuracy", "must be a number.");
    const settings = {
      ...this.texts(json.operating, "#/operating", ["temperature", "voltage", "current", "power"]),
      ...this.texts(json.requirement, "#/requirement", ["min", "max"]),
    };
    if (this.complaints.length > 0) return null;
    return {
      unit: unit as LengthUnit,
      symmetry: symmetry as Sketch["symmetry"],
      rings,
      terminals,
      medium: medium?.medium ?? around.medium,
      regions: medium?.regions ?? [],
      accuracy: accuracy as number,
      settings: json.medium === undefined ? around.settings : settings,
    };
  }

  private list<Item>(
    value: unknown,
    pointer: string,
    read: (item: unknown, pointer: string) => Item | null,
  ): Item[] {
    if (!Array.isArray(value)) {
      this.complain(pointer, "must be a list.");
      return [];
    }
    // Items may be lists themselves, so no flatMap here.
    return value.map((item: unknown, k) => read(item, `${pointer}/${k}`)).filter((item) => item !== null);
  }

  private ring(value: unknown, pointer: string): Ring {
    return this.list(value, pointer, (item, at) => this.vertex(item, at));
  }

  private vertex(item: unknown, pointer: string): Vertex | null {
    if (Array.isArray(item)) {
      const point = this.point(item, pointer);
      return point && { x: point[0], y: point[1] };
    }
    if (!isRecord(item)) {
      return this.complain(pointer, "must be a vertex [x, y] or an arc { arcTo, center, clockwise }.");
    }
    this.only(item, ["arcTo", "center", "clockwise"], pointer);
    const end = this.point(item.arcTo, `${pointer}/arcTo`);
    const center = this.point(item.center, `${pointer}/center`);
    const clockwise = item.clockwise ?? false;
    if (typeof clockwise !== "boolean")
      return this.complain(`${pointer}/clockwise`, "must be true or false.");
    if (!end || !center) return null;
    return { x: end[0], y: end[1], arc: { x: center[0], y: center[1], clockwise } };
  }

  private point(value: unknown, pointer: string): Point | null {
    const numbers = Array.isArray(value) && value.length === 2 && value.every((x) => Number.isFinite(x));
    return numbers ? (value as unknown as Point) : this.complain(pointer, "must be two numbers [x, y].");
  }

  private terminal(value: unknown, pointer: string, rings: readonly Ring[]): Terminal | null {
    if (!isRecord(value))
      return this.complain(pointer, "must be an object with a name and parts or segments.");
    this.only(value, ["name", "parts", "segments"], pointer);
    if (typeof value.name !== "string") return this.complain(`${pointer}/name`, "must be a text.");
    const parts = this.list(value.parts ?? [], `${pointer}/parts`, (part, at) => this.part(part, at));
    const segments = this.list(value.segments ?? [], `${pointer}/segments`, (segment, at) => {
      if (!Array.isArray(segment) || segment.length !== 2) {
        return this.complain(at, "must be two points [[x, y], [x, y]].");
      }
      const [a, b] = [this.point(segment[0], `${at}/0`), this.point(segment[1], `${at}/1`)];
      return a && b && ([a, b] as const);
    });
    const found = segments.map((segment) => partOfSegment(rings, segment));
    return {
      name: value.name,
      parts: [...parts, ...found.filter((part) => part !== null)],
      segments: segments.filter((_, k) => found[k] === null),
    };
  }

  private part(value: unknown, pointer: string): Part | null {
    if (!isRecord(value)) return this.complain(pointer, "must be an object { ring, edge, from, to }.");
    this.only(value, ["ring", "edge", "from", "to"], pointer);
    const { ring, edge, from = 0, to = 1 } = value;
    const whole = { ring, edge, from, to };
    for (const [name, number] of Object.entries(whole)) {
      if (typeof number !== "number") return this.complain(`${pointer}/${name}`, "must be a number.");
    }
    return whole as Part;
  }

  private medium(
    value: unknown,
    pointer: string,
    background: boolean,
  ): { readonly medium: Parameters; readonly regions: readonly Region[] } | null {
    if (!isRecord(value)) return this.complain(pointer, "must be an object such as { sheetResistance: 50 }.");
    const { regions = [], ...plain } = value;
    const medium = this.texts(plain, pointer, MEDIUM_MEMBERS);
    const kinds = MEDIUM_KINDS.filter((kind) => kind in medium);
    if (kinds.length > 1) return this.complain(pointer, `has both ${kinds.join(" and ")}; it must have one.`);
    if (!background) return { medium, regions: [] };
    return {
      medium,
      regions: this.list(regions, `${pointer}/regions`, (region, at) => {
        if (!isRecord(region)) return this.complain(at, "must be an object with a ring and a medium.");
        this.only(region, ["ring", "medium"], at);
        const ring = this.ring(region.ring, `${at}/ring`);
        if (ring.some(({ arc }) => arc)) return this.complain(`${at}/ring`, "must have straight edges only.");
        const inner = this.medium(region.medium, `${at}/medium`, false);
        return inner && { ring, medium: inner.medium };
      }),
    };
  }

  /** Numbers, texts and flags of a group as the texts that its fields show. */
  private texts(value: unknown, pointer: string, members: readonly string[]): Parameters {
    if (value === undefined) return {};
    if (!isRecord(value)) {
      this.complain(pointer, "must be an object.");
      return {};
    }
    const texts: Record<string, string> = {};
    this.only(value, members, pointer);
    for (const [name, entry] of Object.entries(value)) {
      if (!members.includes(name)) continue;
      if (["string", "number", "boolean"].includes(typeof entry)) texts[name] = String(entry);
      else this.complain(`${pointer}/${name}`, "must be a number or a text.");
    }
    return texts;
  }

  /** Nothing is dropped in silence: a misspelt member would be a drawing without its holes. */
  private only(
    record: Json,
    members: readonly string[],
    pointer: string,
    passed: readonly string[] = [],
  ): void {
    for (const name of Object.keys(record)) {
      if (members.includes(name) || passed.includes(name)) continue;
      this.complain(`${pointer}/${name}`, `is not known here; there are ${members.join(", ")}.`);
    }
  }
}
