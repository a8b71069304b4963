import type { OutlinePlan, PlanPoint } from "./outline-plan";

interface OutlineDrawingProps {
  readonly plan: OutlinePlan;
  /** What it shows, in words. */
  readonly label: string;
  /** Without names at the terminals, for a place in a list. */
  readonly bare?: boolean;
  readonly className?: string;
}

/** A plan drawing in the page's colours: the first terminal in copper, the second in verdigris, as everywhere. */
export function OutlineDrawing({ plan, label, bare = false, className = "" }: OutlineDrawingProps) {
  const { width, height, path, terminals } = plan;
  return (
    <svg viewBox={`0 0 ${width} ${height}`} role="img" aria-label={label} className={className}>
      <path d={path} fillRule="evenodd" className="fill-copper/12 stroke-ink" strokeWidth="1" />
      {terminals.map((terminal, index) => (
        <path
          key={terminal.name}
          d={terminal.path}
          strokeWidth="4"
          className={`fill-none ${stroke(index)}`}
        />
      ))}
      {bare
        ? null
        : terminals.map(({ name, at }) => (
            <text
              key={name}
              {...labelAt(at, plan)}
              aria-hidden
              fontSize="13"
              strokeWidth="4"
              strokeLinejoin="round"
              className="fill-ink stroke-sheet [paint-order:stroke]"
            >
              {name.length > 24 ? `${name.slice(0, 23)}…` : name}
            </text>
          ))}
    </svg>
  );
}

function stroke(index: number): string {
  if (index === 0) return "stroke-copper";
  return index === 1 ? "stroke-verdigris" : "stroke-ink-soft";
}

/** Beside the terminal, on the side of the sheet's middle, so that no name is cut off. */
function labelAt([x, y]: PlanPoint, { width, height }: OutlinePlan) {
  const [across, up] = [x / width - 0.5, y / height - 0.5];
  if (Math.abs(across) > Math.abs(up)) {
    return across < 0
      ? { x: x + 7, y: y + 4, textAnchor: "start" as const }
      : { x: x - 7, y: y + 4, textAnchor: "end" as const };
  }
  const anchor = across < -0.35 ? "start" : across > 0.35 ? "end" : "middle";
  return { x, y: up < 0 ? y + 17 : y - 8, textAnchor: anchor } as const;
}
