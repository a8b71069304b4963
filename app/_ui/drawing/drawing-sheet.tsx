import { symbolParts } from "../symbol-text";
import { type Arrowhead, type PlacedDimension, round } from "./dimension-line";
import { FONT_SIZE } from "./label";
import type { Sheet } from "./sheet";
import type { ViewLayout } from "./view-layout";

interface DrawingSheetProps {
  readonly sheet: Sheet;
  readonly toScale: boolean;
  /** Prefix of the ids inside, unique on the page. */
  readonly id: string;
  readonly description: string;
  /** What is read out beside the description. */
  readonly words?: { readonly notToScale: string; readonly dimensions: string };
  readonly focused?: string;
  readonly className?: string;
}

const WORDS = { notToScale: "not to scale", dimensions: "Dimensions" };

/** One laid-out sheet as SVG. Colours come from the tokens, so it follows the theme and prints dark on light. */
export function DrawingSheet(props: DrawingSheetProps) {
  const { sheet, toScale, id, description, words = WORDS, focused, className } = props;
  const values = sheet.views
    .flatMap(({ view }) => view.dimensions)
    .filter(({ label }) => label.value)
    .map(({ label }) => `${label.symbol} = ${label.value}`);
  const dimensions = values.length > 0 ? ` ${words.dimensions}: ${[...new Set(values)].join(", ")}.` : "";
  const note = words.notToScale[0].toUpperCase() + words.notToScale.slice(1);
  const text = `${description}${dimensions}${toScale ? "" : ` ${note}.`}`;
  return (
    <svg
      role="img"
      aria-label={text}
      viewBox={`0 0 ${round(sheet.width)} ${round(sheet.height)}`}
      fontSize={FONT_SIZE}
      className={`${className} font-sans print:[print-color-adjust:exact]`}
    >
      <defs>
        <pattern
          id={`${id}-hatch`}
          width="5"
          height="5"
          patternUnits="userSpaceOnUse"
          patternTransform="rotate(45)"
        >
          <path d="M0 0V5" className="stroke-copper" strokeWidth="1.1" />
        </pattern>
        <pattern
          id={`${id}-second`}
          width="7"
          height="7"
          patternUnits="userSpaceOnUse"
          patternTransform="rotate(-45)"
        >
          <path d="M0 0V7" className="stroke-ink-soft" strokeWidth="0.9" strokeDasharray="4 3" />
        </pattern>
      </defs>
      {sheet.views.map(({ view, x, y, title, titleY }, index) => (
        <g key={index}>
          <g transform={`translate(${round(x + view.shift[0])} ${round(y + view.shift[1])})`}>
            <Body view={view} id={id} />
            {view.dimensions.map((dimension, place) => (
              <Dimension key={place} dimension={dimension} focused={dimension.name === focused} />
            ))}
          </g>
          {title ? (
            <text
              x={round(x + view.width / 2)}
              y={round(titleY)}
              textAnchor="middle"
              className="fill-ink-soft"
            >
              {title}
            </text>
          ) : null}
        </g>
      ))}
    </svg>
  );
}

const LINE_STYLES = {
  axis: { className: "stroke-ink-soft", strokeWidth: 0.8, strokeDasharray: "10 3 2 3" },
  hidden: { className: "stroke-ink", strokeWidth: 0.9, strokeDasharray: "5 3" },
  thin: { className: "stroke-ink", strokeWidth: 0.8 },
  ground: { className: "stroke-ink", strokeWidth: 1.6 },
} as const;

function Body({ view, id }: { readonly view: ViewLayout; readonly id: string }) {
  return (
    <g fill="none">
      {view.second ? (
        <path
          d={view.second}
          fillRule="evenodd"
          fill={`url(#${id}-second)`}
          className="stroke-ink"
          strokeWidth="1"
        />
      ) : null}
      <path d={view.conductor} fillRule="evenodd" className="fill-copper/10" />
      <path
        d={view.conductor}
        fillRule="evenodd"
        fill={`url(#${id}-hatch)`}
        className="stroke-ink"
        strokeWidth="1.1"
        strokeLinejoin="round"
      />
      {view.lines.map(({ path, style }, index) => (
        <path key={index} d={path} {...LINE_STYLES[style]} />
      ))}
      {view.soil.map((path, index) => (
        <path key={index} d={path} className="stroke-ink" strokeWidth="0.8" />
      ))}
      {view.high.map((path, index) => (
        <path key={index} d={path} className="stroke-copper" strokeWidth="4.5" />
      ))}
      {view.low.map((path, index) => (
        <g key={index}>
          <path d={path} className="stroke-verdigris" strokeWidth="5" />
          <path d={path} className="stroke-sheet" strokeWidth="1.2" />
        </g>
      ))}
      {view.flow.map(({ from, to }, index) => {
        const angle = Math.atan2(to[1] - from[1], to[0] - from[0]);
        const barb = (turn: number) =>
          `${round(to[0] - 7 * Math.cos(angle + turn))} ${round(to[1] - 7 * Math.sin(angle + turn))}`;
        const path = `M${round(from[0])} ${round(from[1])}L${round(to[0])} ${round(to[1])}M${barb(0.45)}L${round(to[0])} ${round(to[1])}L${barb(-0.45)}`;
        return (
          <g key={index} strokeLinecap="round" strokeLinejoin="round">
            <path d={path} className="stroke-sheet" strokeWidth="4.5" />
            <path d={path} className="stroke-ink" strokeWidth="1.5" />
          </g>
        );
      })}
    </g>
  );
}

function Dimension({
  dimension,
  focused,
}: {
  readonly dimension: PlacedDimension;
  readonly focused: boolean;
}) {
  const { lines, arc, arrows, label, box } = dimension;
  const middle = round(box.x + box.width / 2);
  return (
    <g className={focused ? "text-copper" : "text-ink"} data-dimension={dimension.name}>
      <g fill="none" stroke="currentColor" strokeWidth={focused ? 1.8 : 0.8}>
        {lines.map(({ from, to }, index) => (
          <path key={index} d={`M${round(from[0])} ${round(from[1])}L${round(to[0])} ${round(to[1])}`} />
        ))}
        {arc ? <path d={arc} /> : null}
      </g>
      {arrows.map((arrow, index) => (
        <path key={index} d={arrowPath(arrow)} fill="currentColor" />
      ))}
      <rect
        x={round(box.x)}
        y={round(box.y)}
        width={round(box.width)}
        height={round(box.height)}
        rx="2"
        className={focused ? "fill-sheet stroke-copper" : "fill-sheet"}
        strokeWidth="1.5"
      />
      <text
        x={middle}
        y={round(box.y + box.height / 2 + 0.35 * FONT_SIZE)}
        textAnchor="middle"
        fill="currentColor"
        className="tabular-nums [word-spacing:0.12em]"
      >
        {symbolParts(label.symbol).map((part, index, parts) => (
          <tspan
            key={index}
            fontStyle={part.sub ? "normal" : "italic"}
            fontSize={part.sub ? 0.75 * FONT_SIZE : undefined}
            dy={part.sub ? 3 : parts[index - 1]?.sub ? -3 : undefined}
          >
            {part.text}
          </tspan>
        ))}
        {label.value ? (
          <tspan dy={symbolParts(label.symbol).at(-1)?.sub ? -3 : undefined}>{` = ${label.value}`}</tspan>
        ) : null}
      </text>
    </g>
  );
}

function arrowPath({ tip, angle }: Arrowhead): string {
  const back = (turn: number) => {
    const x = round(tip[0] - 9.2 * Math.cos(angle + turn));
    const y = round(tip[1] - 9.2 * Math.sin(angle + turn));
    return `${x} ${y}`;
  };
  return `M${round(tip[0])} ${round(tip[1])}L${back(0.18)}L${back(-0.18)}Z`;
}
