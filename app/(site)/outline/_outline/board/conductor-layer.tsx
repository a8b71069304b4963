import { memo, useId } from "react";
import { type Point, type Ring, ringKeys, ringOf, type Sketch } from "../../_model/sketch";
import { type Size, toScreen, type View } from "../../_model/view";
import { conductorPath, type Lens, partPoints, pathOf, ringPath } from "./paths";

interface ConductorLayerProps {
  readonly sketch: Sketch;
  readonly view: View;
  readonly size: Size;
  /** Leaves the hatch out, where the density is drawn. */
  readonly bare: boolean;
}

/** The conductor with its hatch, the regions in it, and the terminals with their names. */
export const ConductorLayer = memo(function ConductorLayer(props: ConductorLayerProps) {
  const { sketch, view, size, bare } = props;
  const lens: Lens = { view, size };
  const hatch = useId();
  const counter = useId();
  const outline = conductorPath(lens, sketch.rings);
  return (
    <g pointerEvents="none">
      <defs>
        <Hatch id={hatch} turn={45} className="stroke-copper" />
        <Hatch id={counter} turn={-45} className="stroke-ink-soft" />
      </defs>
      {bare ? null : (
        <>
          <path d={outline} fillRule="evenodd" className="fill-copper/8" />
          <path d={outline} fillRule="evenodd" fill={`url(#${hatch})`} opacity="0.45" />
        </>
      )}
      {sketch.symmetry === "axisymmetric" ? <Mirrored sketch={sketch} lens={lens} /> : null}
      {sketch.regions.map(({ ring }, k) => (
        <g key={k}>
          <path
            d={ringPath(lens, ring)}
            fill={bare ? "none" : `url(#${counter})`}
            className="stroke-ink"
            strokeWidth="1.2"
            strokeDasharray="5 3"
          />
          <Label lens={lens} at={middleOf(ring)} text={`region ${k}`} className="fill-ink" />
        </g>
      ))}
      <path
        d={outline}
        fill="none"
        className="stroke-ink"
        strokeWidth="1.5"
        strokeLinejoin="round"
        fillRule="evenodd"
      />
    </g>
  );
});

/** Terminals over everything else. */
export const TerminalLayer = memo(function TerminalLayer({
  sketch,
  view,
  size,
}: Omit<ConductorLayerProps, "bare">) {
  const lens: Lens = { view, size };
  return (
    <g pointerEvents="none">
      {sketch.terminals.map(({ name, parts, segments }, k) => {
        const lines = [...parts.map((part) => partPoints(sketch, part)), ...segments].filter(
          (line) => line.length > 0,
        );
        return (
          <g key={k} data-terminal={name}>
            {lines.map((line, i) => (
              <path
                key={i}
                d={pathOf(lens, line)}
                fill="none"
                className={TERMINAL_STROKES[Math.min(k, 2)]}
                strokeWidth="6"
                strokeLinecap="round"
                strokeLinejoin="round"
              />
            ))}
            {lines.length > 0 ? (
              <Label
                lens={lens}
                at={lines[0][Math.floor((lines[0].length - 1) / 2)]}
                to={lines[0][Math.ceil((lines[0].length - 1) / 2)]}
                text={name}
                className={TERMINAL_FILLS[Math.min(k, 2)]}
                away={outwards(sketch, lens, lines[0])}
              />
            ) : null}
          </g>
        );
      })}
    </g>
  );
});

const TERMINAL_STROKES = ["stroke-copper", "stroke-verdigris", "stroke-ink"] as const;
const TERMINAL_FILLS = ["fill-copper", "fill-verdigris", "fill-ink"] as const;

/** The other half of a solid of revolution, faintly. */
function Mirrored({ sketch, lens }: { readonly sketch: Sketch; readonly lens: Lens }) {
  const mirror = (ring: Ring): Ring =>
    ring.map(({ x, y, arc }) => ({
      x: -x,
      y,
      ...(arc ? { arc: { x: -arc.x, y: arc.y, clockwise: !arc.clockwise } } : {}),
    }));
  return (
    <path
      d={conductorPath(lens, sketch.rings.map(mirror))}
      fillRule="evenodd"
      className="fill-copper/5 stroke-edge"
      strokeWidth="1"
      strokeDasharray="3 4"
    />
  );
}

function Hatch({
  id,
  turn,
  className,
}: {
  readonly id: string;
  readonly turn: number;
  readonly className: string;
}) {
  return (
    <pattern id={id} width="7" height="7" patternUnits="userSpaceOnUse" patternTransform={`rotate(${turn})`}>
      <path d="M0 0V7" className={className} strokeWidth="1" />
    </pattern>
  );
}

interface LabelProps {
  readonly lens: Lens;
  readonly at: Point;
  readonly to?: Point;
  readonly text: string;
  readonly className: string;
  /** Direction in which the label stands off, in pixels. */
  readonly away?: Point;
}

function Label({ lens, at, to = at, text, className, away = [0, 0] }: LabelProps) {
  const [ax, ay] = toScreen(lens.view, lens.size, at);
  const [bx, by] = toScreen(lens.view, lens.size, to);
  const anchor = away[0] > 4 ? "start" : away[0] < -4 ? "end" : "middle";
  return (
    <text
      x={(ax + bx) / 2 + away[0]}
      y={(ay + by) / 2 + away[1]}
      dy="0.35em"
      textAnchor={anchor}
      className={`text-[13px] font-semibold ${className}`}
      style={{ paintOrder: "stroke", stroke: "var(--sheet)", strokeWidth: 4, strokeLinejoin: "round" }}
    >
      {text}
    </text>
  );
}

/** Away from the middle of the drawing, across the line. */
function outwards(sketch: Sketch, { view, size }: Lens, line: readonly Point[]): Point {
  const k = Math.max(1, Math.ceil((line.length - 1) / 2));
  const [ax, ay] = toScreen(view, size, line[k - 1]);
  const [bx, by] = toScreen(view, size, line[k]);
  const length = Math.hypot(bx - ax, by - ay) || 1;
  const [nx, ny] = [(by - ay) / length, -(bx - ax) / length];
  const [cx, cy] = toScreen(view, size, middleOf(sketch.rings[0]));
  const side = nx * ((ax + bx) / 2 - cx) + ny * ((ay + by) / 2 - cy) >= 0 ? 1 : -1;
  return [side * nx * 14, side * ny * 16];
}

function middleOf(ring: Ring): Point {
  const n = Math.max(1, ring.length);
  return [ring.reduce((sum, { x }) => sum + x, 0) / n, ring.reduce((sum, { y }) => sum + y, 0) / n];
}

/** Most vertices with a handle each; beyond, only the one under the pointer shows. */
const MOST_HANDLES = 400;

export function handlesShown(sketch: Sketch): boolean {
  return ringKeys(sketch).reduce((sum, key) => sum + ringOf(sketch, key).length, 0) <= MOST_HANDLES;
}
