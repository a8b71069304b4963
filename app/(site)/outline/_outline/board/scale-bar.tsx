import { coordinateText } from "../../_model/sketch";
import { roundLength, type Size, type View } from "../../_model/view";

/** A round length, to read sizes off. */
export function ScaleBar({
  view,
  size,
  unit,
}: {
  readonly view: View;
  readonly size: Size;
  readonly unit: string;
}) {
  const length = roundLength(view.scale, Math.min(160, size.width / 3));
  const px = length * view.scale;
  return (
    <g transform={`translate(${size.width - px - 16} ${size.height - 30})`} pointerEvents="none">
      <rect x="-6" y="-18" width={px + 12} height="28" className="fill-sheet" opacity="0.8" />
      <path d={`M0 -4V4M0 0H${px}M${px} -4V4`} fill="none" className="stroke-ink" strokeWidth="1.5" />
      <text x={px / 2} y="-6" textAnchor="middle" className="fill-ink font-mono text-[12px]">
        {coordinateText(length)} {unit === "um" ? "µm" : unit}
      </text>
    </g>
  );
}
