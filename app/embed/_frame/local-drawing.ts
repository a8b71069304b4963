import { filled } from "../_words/words";
import type { FrameDrawing, FrameView } from "./frame-view";
import { localNumbers } from "./local-number";

/**
 * A drawing in the frame's language: the names of its views, its numbers, and for readers who do not see it which views
 * there are. In English it is described as the engine does.
 */
export function localDrawing(
  { drawing, labels, toScale }: FrameDrawing,
  { locale, words, viewTitles }: Pick<FrameView, "locale" | "words" | "viewTitles">,
): FrameDrawing {
  const local = Object.fromEntries(
    Object.entries(labels).map(([name, label]) => [
      name,
      label.value === undefined ? label : { ...label, value: localNumbers(label.value, locale) },
    ]),
  );
  const views = drawing.views.map((each) => ({ ...each, title: viewTitles[each.title] ?? each.title }));
  if (locale.startsWith("en")) return { drawing, labels: local, toScale };
  const names = views.map(({ title }) => title).join(", ");
  return { drawing: { views, description: filled(words.drawing, names) }, labels: local, toScale };
}
