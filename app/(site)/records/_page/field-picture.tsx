import type { PlotColours } from "@/lib/engine";
import type { Draw } from "../_content/content";

/** The page's own colours, so that the picture follows the theme; paper is always light. */
const COLOURS: PlotColours = {
  sheet: "var(--sheet)",
  ink: "var(--ink)",
  soft: "var(--ink-soft)",
  edge: "var(--edge)",
  high: "var(--copper)",
  low: "var(--verdigris)",
  open: "var(--ink-soft)",
};

interface FieldPictureProps {
  readonly draw: Draw;
  readonly description: string;
  /** Unique in the page. */
  readonly id: string;
}

/**
 * A picture over the whole column. Laid out twice, for narrow and for wide places, and the container decides, so that its
 * texts stay legible at each width without a script, and on paper.
 */
export function FieldPicture({ draw, description, id }: FieldPictureProps) {
  const narrow = draw({
    width: 400,
    tallest: 480,
    titled: false,
    ground: false,
    colours: COLOURS,
    id: `${id}-narrow`,
  });
  const wide = draw({
    width: 880,
    tallest: 560,
    titled: false,
    ground: false,
    colours: COLOURS,
    id: `${id}-wide`,
  });
  const fill = "[&>svg]:block [&>svg]:h-auto [&>svg]:w-full [&_text]:font-sans";
  return (
    <div role="img" aria-label={description} className="@container">
      <div
        className={`mx-auto max-w-[560px] @min-[600px]:hidden ${fill}`}
        dangerouslySetInnerHTML={{ __html: narrow }}
      />
      <div className={`hidden @min-[600px]:block ${fill}`} dangerouslySetInnerHTML={{ __html: wide }} />
    </div>
  );
}
