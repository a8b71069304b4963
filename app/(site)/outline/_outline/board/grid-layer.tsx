import { memo } from "react";
import { coordinateText } from "../../_model/sketch";
import { scaleBarStart, type Size, shownStep, toPlane, toScreen, type View } from "../../_model/view";

interface GridLayerProps {
  readonly view: View;
  readonly size: Size;
  readonly step: number;
  /** Draws the axis of revolution. */
  readonly axis: boolean;
}

/** Grid lines, every tenth stronger, with the coordinates of the strong ones at the edges of the board. */
export const GridLayer = memo(function GridLayer({ view, size, step, axis }: GridLayerProps) {
  const fine = shownStep(step, view.scale);
  const coarse = shownStep(fine, view.scale, 70);
  const [left, top] = toPlane(view, size, [0, 0]);
  const [right, bottom] = toPlane(view, size, [size.width, size.height]);
  const columns = ticks(left, right, fine);
  const rows = ticks(bottom, top, fine);
  const x = (value: number) => toScreen(view, size, [value, 0])[0];
  const y = (value: number) => toScreen(view, size, [0, value])[1];
  const strong = (value: number) => {
    const share = value / coarse;
    return Math.abs(share - Math.round(share)) < 1e-6;
  };
  const verticals = (values: readonly number[]) => values.map((v) => `M${x(v)} 0V${size.height}`).join("");
  const horizontals = (values: readonly number[]) => values.map((v) => `M0 ${y(v)}H${size.width}`).join("");
  const both = (test: (value: number) => boolean) =>
    verticals(columns.filter(test)) + horizontals(rows.filter(test));
  const axisX = x(0);
  // Half a label's width in this type; what would touch the scale bar is left out.
  const half = (value: number) => 3.5 * coordinateText(value).length + 4;
  const free = scaleBarStart(view, size);
  return (
    <g pointerEvents="none">
      <path d={both((value) => !strong(value))} className="stroke-rule" strokeWidth="1" opacity="0.45" />
      <path d={both(strong)} className="stroke-rule" strokeWidth="1" />
      <g className="fill-ink-soft font-mono text-[11px]">
        {columns.filter(strong).map((value) =>
          x(value) > 34 && x(value) + half(value) < free ? (
            <text key={value} x={x(value)} y={size.height - 5} textAnchor="middle">
              {coordinateText(value)}
            </text>
          ) : null,
        )}
        {rows.filter(strong).map((value) =>
          y(value) > 12 && y(value) < size.height - 22 ? (
            <text key={value} x="4" y={y(value)} dy="0.35em">
              {coordinateText(value)}
            </text>
          ) : null,
        )}
      </g>
      {axis && axisX > -1 && axisX < size.width + 1 ? (
        <path
          d={`M${axisX} 0V${size.height}`}
          className="stroke-ink-soft"
          strokeWidth="1.2"
          strokeDasharray="14 4 3 4"
        />
      ) : null}
    </g>
  );
});

function ticks(from: number, to: number, step: number): readonly number[] {
  const first = Math.ceil(from / step);
  const count = Math.min(2000, Math.max(0, Math.floor(to / step) - first + 1));
  return Array.from({ length: count }, (_, k) => (first + k) * step + 0);
}
