import { coordinateText } from "../../_model/sketch";
import { scaleBarLength, type Size, type View } from "../../_model/view";

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
  const length = scaleBarLength(view, size);
  const px = length * view.scale;
  return (
    <g transform={`translate(${size.width - px - 10} ${size.height - 9})`} pointerEvents="none">
      <rect x="-70" y="-9" width={px + 80} height="18" className="fill-sheet" />
      <path d={`M0 -4V4M0 0H${px}M${px} -4V4`} fill="none" className="stroke-ink" strokeWidth="1.5" />
      <text x="-6" dy="0.35em" textAnchor="end" className="fill-ink font-mono text-[12px]">
        {coordinateText(length)} {unit === "um" ? "µm" : unit}
      </text>
    </g>
  );
}
