import type { Hit } from "../../_model/hit";
import { edgeOf, pointAt } from "../../_model/edges";
import type { PlacedComplaint } from "../../_model/complaints";
import { ringKeys, ringOf, type Sketch } from "../../_model/sketch";
import { toScreen } from "../../_model/view";
import type { Selection } from "../outline-context";
import { handlesShown } from "./conductor-layer";
import { type Lens, pathOf, ringPath } from "./paths";
import { stretch } from "../../_model/edges";

interface HandleLayerProps {
  readonly sketch: Sketch;
  readonly lens: Lens;
  readonly selection: Selection | null;
  readonly hover: Hit | null;
  readonly complaints: readonly PlacedComplaint[];
  /** Whether vertices can be taken hold of. */
  readonly vertices: boolean;
}

/** Handles of vertices, what is marked, what lies under the pointer, and what the API complained about. */
export function HandleLayer(props: HandleLayerProps) {
  const { sketch, lens, selection, hover, complaints, vertices } = props;
  const place = (x: number, y: number) => toScreen(lens.view, lens.size, [x, y]);
  const shown = vertices && handlesShown(sketch);
  return (
    <g pointerEvents="none" data-cursor="">
      {hover?.kind === "edge" ? <EdgeMark {...props} ring={hover.ring} index={hover.index} soft /> : null}
      {selection?.kind === "edge" ? (
        <EdgeMark {...props} ring={selection.ring} index={selection.index} />
      ) : null}
      {complaints.map((complaint, k) => (
        <ComplaintMark key={k} {...props} complaint={complaint} />
      ))}
      {shown
        ? ringKeys(sketch).flatMap((ring) =>
            ringOf(sketch, ring).map(({ x, y }, index) => {
              const [px, py] = place(x, y);
              return (
                <rect
                  key={`${ring} ${index}`}
                  x={px - 4}
                  y={py - 4}
                  width="8"
                  height="8"
                  className="fill-sheet stroke-ink"
                  strokeWidth="1.5"
                />
              );
            }),
          )
        : null}
      {hover?.kind === "vertex" ? <VertexMark {...props} ring={hover.ring} index={hover.index} soft /> : null}
      {selection?.kind === "vertex" ? (
        <VertexMark {...props} ring={selection.ring} index={selection.index} />
      ) : null}
      {vertices && selection?.kind === "edge" ? <BowHandle {...props} /> : null}
    </g>
  );
}

interface ComplaintMarkProps extends Pick<HandleLayerProps, "sketch" | "lens"> {
  readonly complaint: PlacedComplaint;
}

/** Where a complaint is: the edge with the place on it, the vertex, the whole ring, or a terminal's stretch. */
function ComplaintMark({ sketch, lens, complaint: { place, at } }: ComplaintMarkProps) {
  const shared = { sketch, lens, wrong: true };
  if (place?.kind === "ring") {
    return (
      <path
        d={ringPath(lens, ringOf(sketch, place.ring))}
        fill="none"
        className="stroke-oxide"
        strokeWidth="3"
      />
    );
  }
  if (place?.kind === "terminal") {
    const parts = sketch.terminals[place.terminal]?.parts ?? [];
    const marked = place.list === "parts" && place.item !== undefined ? [parts[place.item]] : [];
    return marked.map((part) =>
      part ? <EdgeMark key={part.edge} {...shared} ring={part.ring} index={part.edge} /> : null,
    );
  }
  if (place?.kind !== "vertex") return null;
  const vertex = ringOf(sketch, place.ring)[place.index];
  if (!vertex) return null;
  const [x, y] = toScreen(lens.view, lens.size, at ?? [vertex.x, vertex.y]);
  return (
    <g data-complaint={`${place.ring}/${place.index}`}>
      {at ? <EdgeMark {...shared} ring={place.ring} index={place.index} /> : null}
      <circle cx={x} cy={y} r="10" fill="none" className="stroke-oxide" strokeWidth="2.5" />
    </g>
  );
}

interface MarkProps extends Pick<HandleLayerProps, "sketch" | "lens"> {
  readonly ring: number;
  readonly index: number;
  readonly soft?: boolean;
  readonly wrong?: boolean;
}

function EdgeMark({ sketch, lens, ring, index, soft = false, wrong = false }: MarkProps) {
  const vertices = ringOf(sketch, ring);
  if (index < 0 || index >= vertices.length) return null;
  return (
    <path
      d={pathOf(lens, stretch(edgeOf(vertices, index), 0, 1))}
      fill="none"
      className={wrong ? "stroke-oxide" : "stroke-ink"}
      strokeWidth={wrong ? 3 : 5}
      strokeLinecap="round"
      opacity={soft ? 0.35 : 0.8}
    />
  );
}

function VertexMark({ sketch, lens, ring, index, soft = false }: MarkProps) {
  const vertex = ringOf(sketch, ring)[index];
  if (!vertex) return null;
  const [x, y] = toScreen(lens.view, lens.size, [vertex.x, vertex.y]);
  return (
    <rect
      x={x - 6}
      y={y - 6}
      width="12"
      height="12"
      className={soft ? "fill-sheet stroke-ink" : "fill-ink stroke-sheet"}
      strokeWidth="2"
    />
  );
}

/** The middle of the marked edge, by which it is bowed. Regions have straight borders. */
function BowHandle({ sketch, lens, selection }: HandleLayerProps) {
  if (!selection || selection.ring < 0) return null;
  const vertices = ringOf(sketch, selection.ring);
  if (selection.index >= vertices.length) return null;
  const [x, y] = toScreen(lens.view, lens.size, pointAt(edgeOf(vertices, selection.index), 0.5));
  return (
    <path
      d={`M${x - 8} ${y}L${x} ${y - 8}L${x + 8} ${y}L${x} ${y + 8}Z`}
      className="fill-copper stroke-sheet"
      strokeWidth="2"
    />
  );
}
