import { type Box, rowBox } from "./math-box";
import { type MathNode, mathTree } from "./math-tree";
import { lineStep, type Pen } from "./pen";

/** A line is rather shrunk to this share of its size than broken. */
const RATHER_SCALE = 0.8;
/** Smallest share of its size to which one that cannot be broken is shrunk. */
const LEAST_SCALE = 0.5;

/** Sets a formula from `x` on within `width`, in as many lines as it takes, and moves on below it. */
export function formula(pen: Pen, tex: string, size: number, x: number, width: number): void {
  for (const { box, scale } of formulaLines(pen, tex, size, width)) {
    const height = (box.ascent + box.descent) * scale + size * 0.35;
    pen.keep(height);
    pen.doc.save();
    pen.doc.translate(x, pen.y + box.ascent * scale).scale(scale);
    box.draw(0, 0);
    pen.doc.restore();
    pen.y += height;
  }
}

/** Height that a formula takes, points. */
export function formulaHeight(pen: Pen, tex: string, size: number, width: number): number {
  return formulaLines(pen, tex, size, width).reduce(
    (sum, { box, scale }) => sum + (box.ascent + box.descent) * scale + size * 0.35,
    0,
  );
}

function formulaLines(
  pen: Pen,
  tex: string,
  size: number,
  width: number,
): readonly { readonly box: Box; readonly scale: number }[] {
  const tree = mathTree(tex);
  if (!tree)
    return pen
      .lines(tex, width, { face: "number", size })
      .map((text) => ({ box: plain(pen, text, size), scale: 1 }));
  const lines: MathNode[][] = [[]];
  for (const piece of pieces(tree)) {
    const longer = [...lines[lines.length - 1], ...piece];
    if (lines[lines.length - 1].length === 0 || rowBox(pen, longer, size).width * RATHER_SCALE <= width) {
      lines[lines.length - 1] = longer;
    } else lines.push(piece.filter((node, index) => index > 0 || node.name !== "mspace"));
  }
  return lines.map((nodes) => {
    const box = rowBox(pen, nodes, size);
    return { box, scale: Math.max(LEAST_SCALE, Math.min(1, width / (box.width || 1))) };
  });
}

function plain(pen: Pen, text: string, size: number): Box {
  const style = { face: "number", size } as const;
  return {
    width: pen.widthOf(text, style),
    ascent: lineStep(style) * 0.76,
    descent: lineStep(style) * 0.24,
    draw: (x, baseline) => void pen.line(text, x, baseline, style),
  };
}

/** Parts between which a formula may go on in the next line: wide spaces, then relations. */
function pieces(tree: MathNode): MathNode[][] {
  const nodes = tree.name === "mrow" ? flat(tree) : [tree];
  const parts: MathNode[][] = [[]];
  let afterRelation = false;
  for (const node of nodes) {
    const wide = node.name === "mspace" && Number.parseFloat(node.attributes.width ?? "0") >= 1;
    const relation = node.name === "mo" && node.text === "=";
    if (wide || (relation && afterRelation)) parts.push([]);
    if (wide) afterRelation = false;
    if (relation) afterRelation = true;
    parts[parts.length - 1].push(node);
  }
  return parts.filter((part) => part.length > 0);
}

/** The top row, without rows that only group. */
function flat(node: MathNode): readonly MathNode[] {
  return node.children.length === 1 && node.children[0].name === "mrow"
    ? flat(node.children[0])
    : node.children;
}
