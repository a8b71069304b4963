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
              {...labelAt(at, width)}
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

/** Beside the terminal, towards the middle of the sheet, so that no name is cut off. */
function labelAt([x, y]: PlanPoint, width: number) {
  const share = x / width;
  if (share < 0.35) return { x: x + 7, y: y + 4, textAnchor: "start" as const };
  return share > 0.65
    ? { x: x - 7, y: y + 4, textAnchor: "end" as const }
    : { x, y: y + 4, textAnchor: "middle" as const };
}
