import type { Point } from "../../_model/sketch";
import { toScreen } from "../../_model/view";
import { type Lens, pathOf } from "./paths";

interface DraftLayerProps {
  readonly lens: Lens;
  readonly points: readonly Point[];
  /** Where the next vertex would be. */
  readonly cursor: Point | null;
}

/** A ring while it is drawn. */
export function DraftLayer({ lens, points, cursor }: DraftLayerProps) {
  const line = cursor ? [...points, cursor] : points;
  return (
    <g pointerEvents="none" data-cursor="">
      {line.length > 2 ? <path d={pathOf(lens, line, true)} className="fill-copper/10" /> : null}
      <path d={pathOf(lens, line)} fill="none" className="stroke-copper" strokeWidth="2" />
      {points.map((point, k) => {
        const [x, y] = toScreen(lens.view, lens.size, point);
        return (
          <circle
            key={k}
            cx={x}
            cy={y}
            r={k === 0 ? 7 : 4}
            className={k === 0 ? "fill-sheet stroke-copper" : "fill-copper stroke-sheet"}
            strokeWidth="2"
          />
        );
      })}
      {cursor ? <Cross at={toScreen(lens.view, lens.size, cursor)} /> : null}
    </g>
  );
}

export function Cross({ at: [x, y] }: { readonly at: Point }) {
  return (
    <path
      d={`M${x - 9} ${y}H${x - 2}M${x + 2} ${y}H${x + 9}M${x} ${y - 9}V${y - 2}M${x} ${y + 2}V${y + 9}`}
      className="stroke-ink"
      strokeWidth="1.5"
    />
  );
}
