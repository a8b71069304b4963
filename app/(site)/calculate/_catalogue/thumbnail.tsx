import "server-only";
import { readableDrawing, resolveDimensions, type Shape } from "@/lib/engine";
import { DrawingSheet } from "../../../_ui/drawing/drawing-sheet";
import { layoutView } from "../../../_ui/drawing/view-layout";

const WIDTH = 250;
/** Of the body alone; dimension lines come on top. */
const HEIGHT = 110;

/** A shape's first view with its example's dimensions, symbols only. */
export function Thumbnail({ shape }: { readonly shape: Shape }) {
  const { drawing, toScale } = readableDrawing(shape, resolveDimensions(shape, shape.example.dimensions));
  const labels = Object.fromEntries(
    Object.entries(shape.dimensions).map(([name, { symbol }]) => [name, { symbol }]),
  );
  const view = layoutView(drawing.views[0], labels, WIDTH, HEIGHT);
  return (
    <DrawingSheet
      sheet={{
        width: WIDTH,
        height: view.height,
        views: [{ view, x: 0, y: 0, title: "", titleY: 0 }],
        distorted: view.distorted,
      }}
      toScale={toScale && !view.distorted}
      id={`thumb-${shape.id}`}
      description={drawing.description}
      className="block h-full max-h-[170px] w-full"
    />
  );
}
