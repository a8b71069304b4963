/** Where the page shows a complaint of the API, and how it names the place. */
import { sentence } from "../../calculate/_model/complaints";
import { type Point, type RingKey, ringTitle, type Sketch } from "./sketch";

export interface Complaint {
  readonly pointer?: string;
  readonly detail: string;
  /** On the outline, in its unit, where the place is no vertex. */
  readonly at?: Point;
}

export type Place =
  | { readonly kind: "vertex"; readonly ring: RingKey; readonly index: number }
  | { readonly kind: "ring"; readonly ring: RingKey }
  | {
      readonly kind: "terminal";
      readonly terminal: number;
      readonly list?: "parts" | "segments";
      readonly item?: number;
    }
  | { readonly kind: "medium"; readonly name: string }
  | { readonly kind: "region"; readonly region: number; readonly name: string }
  | { readonly kind: "setting"; readonly name: string };

/** `#/outline/holes/0/2` is vertex 2 of ring 1; `#/medium/regions/1/ring/0` vertex 0 of the second region's border. */
export function placeOf(pointer: string): Place | null {
  const path = pointer
    .replace(/^#\/?/, "")
    .split("/")
    .map((part) => decodeURIComponent(part).replaceAll("~1", "/").replaceAll("~0", "~"));
  const number = (k: number): number | undefined =>
    /^\d+$/.test(path[k] ?? "") ? Number(path[k]) : undefined;
  const onRing = (ring: RingKey, index: number | undefined): Place =>
    index === undefined ? { kind: "ring", ring } : { kind: "vertex", ring, index };
  switch (path[0]) {
    case "outline":
      if (path[1] === "outer") return onRing(0, number(2));
      if (path[1] === "holes") {
        const hole = number(2);
        return hole === undefined ? { kind: "ring", ring: 0 } : onRing(hole + 1, number(3));
      }
      return path[1] === undefined ? { kind: "ring", ring: 0 } : { kind: "setting", name: path[1] };
    case "terminals": {
      const terminal = number(1);
      if (terminal === undefined) return { kind: "setting", name: "terminals" };
      const list = path[2] === "parts" || path[2] === "segments" ? path[2] : undefined;
      return { kind: "terminal", terminal, list, item: list && number(3) };
    }
    case "medium": {
      const region = path[1] === "regions" ? number(2) : undefined;
      if (region === undefined) return { kind: "medium", name: path[1] ?? "medium" };
      if (path[3] === "ring") return onRing(-1 - region, number(4));
      return path[3] === "medium"
        ? { kind: "region", region, name: path[4] ?? "medium" }
        : { kind: "ring", ring: -1 - region };
    }
    case "accuracy":
      return { kind: "setting", name: "accuracy" };
    case "operating":
    case "requirement":
      return path[1] === undefined ? null : { kind: "setting", name: path[1] };
    default:
      return null;
  }
}

export interface PlacedComplaint extends Complaint {
  readonly place: Place | null;
}

export function placed(complaints: readonly Complaint[]): readonly PlacedComplaint[] {
  return complaints.map((complaint) => ({
    ...complaint,
    place: complaint.pointer === undefined ? null : placeOf(complaint.pointer),
  }));
}

/** The complaints for which `test` holds, as sentences, each once. */
export function complaintsAt(
  complaints: readonly PlacedComplaint[],
  test: (place: Place) => boolean,
): readonly string[] {
  const found = complaints.filter(({ place }) => place !== null && test(place));
  return [...new Set(found.map(({ detail }) => sentence(detail)))];
}

/** The same as one text, for a field; undefined where there is nothing to say. */
export function complaintAt(
  complaints: readonly PlacedComplaint[],
  test: (place: Place) => boolean,
): string | undefined {
  return complaintsAt(complaints, test).join(" ") || undefined;
}

const SETTINGS: Readonly<Record<string, string>> = {
  accuracy: "Width of the bracket",
  min: "Requirement, at least",
  max: "Requirement, at most",
};

/** A complaint's place in the words of the page: "Outer ring, edge 3", "Terminal in, part 1". */
export function placeTitle({ place, at }: PlacedComplaint, sketch: Sketch): string {
  switch (place?.kind) {
    case "vertex":
      return `${ringTitle(place.ring)}, ${at ? "edge" : "vertex"} ${place.index}`;
    case "ring":
      return ringTitle(place.ring);
    case "terminal": {
      const name = sketch.terminals[place.terminal]?.name || String(place.terminal + 1);
      const stretch = place.list === "segments" ? "stretch" : "part";
      return `Terminal ${name}${place.item === undefined ? "" : `, ${stretch} ${place.item + 1}`}`;
    }
    case "medium":
      return place.name === "medium" ? "Medium" : `Medium, ${spoken(place.name)}`;
    case "region":
      return `Region ${place.region}${place.name === "medium" ? "" : `, ${spoken(place.name)}`}`;
    case "setting":
      return SETTINGS[place.name] ?? sentence(spoken(place.name));
    default:
      return "This outline";
  }
}

/** "sheetResistance" as "sheet resistance". */
function spoken(name: string): string {
  return name.replace(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`);
}

/** Id of the part of the page that has the fields of a place; null for places on the board. */
export function placeId(place: Place): string | null {
  switch (place.kind) {
    case "terminal":
      return `terminal-${place.terminal}`;
    case "medium":
      return "medium";
    case "region":
      return `region-${place.region}`;
    case "setting":
      return place.name === "terminals" ? "terminals" : "goal";
    default:
      return null;
  }
}
