/** Sets a formula: boxes with a baseline, put side by side and above each other. Sizes in points. */
import type { MathNode } from "./math-tree";
import { INK, type Pen, type TextStyle } from "./pen";

export interface Box {
  readonly width: number;
  /** Above and below the baseline. */
  readonly ascent: number;
  readonly descent: number;
  readonly draw: (x: number, baseline: number) => void;
}

const SMALLEST = 5.5;
const SCRIPT = 0.7;
const LARGE = new Set(["∑", "∏", "∫", "∬", "∭", "∮"]);
const RELATIONS = new Set(["=", "<", ">", "≤", "≥", "≈", "→", "≪", "≫", "≠", "∼", "∝"]);
const BINARY = new Set(["+", "−", "-", "±", "⋅", "×", "∓"]);

/** The box of a node at a size. */
export function mathBox(pen: Pen, node: MathNode, size: number): Box {
  const { children } = node;
  const at = (index: number, scale = 1): Box =>
    index < children.length ? mathBox(pen, children[index], Math.max(SMALLEST, size * scale)) : empty();
  switch (node.name) {
    case "mi":
    case "mn":
    case "mo":
    case "mtext":
      return letters(pen, node, size);
    case "mspace":
      return { ...empty(), width: emsOf(node.attributes.width) * size };
    case "mfrac":
      return fraction(pen, at(0, 0.9), at(1, 0.9), size);
    case "msqrt":
      return root(pen, rowBox(pen, children, size), size);
    case "msub":
      return scripts(at(0), at(1, SCRIPT), null, size);
    case "msup":
      return scripts(at(0), null, at(1, SCRIPT), size);
    case "msubsup":
    case "munderover":
      return scripts(at(0), at(1, SCRIPT), at(2, SCRIPT), size);
    case "munder":
      return scripts(at(0), at(1, SCRIPT), null, size);
    case "mover":
      return overlined(pen, at(0), size);
    case "mtable":
      return table(pen, node, size);
    default:
      return rowBox(pen, children, size);
  }
}

function empty(): Box {
  return { width: 0, ascent: 0, descent: 0, draw: () => undefined };
}

function emsOf(width: string | undefined): number {
  const ems = /^(-?[\d.]+)em$/.exec(width ?? "");
  return ems ? Number(ems[1]) : 0;
}

function letters(pen: Pen, { name, text, attributes }: MathNode, size: number): Box {
  const shown = text === "-" ? "−" : text.replace("\u2061", "");
  if (shown === "") return empty();
  const italic = name === "mi" && attributes.mathvariant !== "normal" && [...shown].length === 1;
  const large = LARGE.has(shown);
  const style: TextStyle = { face: italic ? "mathItalic" : "math", size: large ? size * 1.35 : size };
  const prime = shown === "′";
  const width = pen.widthOf(shown, style) + (large ? size * 0.08 : 0);
  const drop = large ? size * 0.18 : 0;
  return {
    width: prime ? size * 0.28 : width,
    ascent: large ? size * 0.95 : size * 0.72,
    descent: large ? size * 0.4 : size * 0.22,
    draw: (x, baseline) => {
      pen.line(shown, x, baseline + drop, style);
    },
  };
}

/** Nodes side by side, with room around relations and operations; fences grow with what they hold. */
export function rowBox(pen: Pen, nodes: readonly MathNode[], size: number): Box {
  const inner = nodes.filter((node) => !isFence(node)).map((node) => mathBox(pen, node, size));
  const tallest = {
    ascent: Math.max(size * 0.72, ...inner.map(({ ascent }) => ascent)),
    descent: Math.max(size * 0.22, ...inner.map(({ descent }) => descent)),
  };
  const placed: { readonly box: Box; readonly x: number }[] = [];
  let x = 0;
  nodes.forEach((node, index) => {
    const box = isFence(node) ? fence(pen, node.text, tallest, size) : mathBox(pen, node, size);
    const [before, after] = roomAround(nodes, index, size);
    placed.push({ box, x: x + before });
    x += before + box.width + after;
  });
  return {
    width: x,
    ascent: Math.max(0, ...placed.map(({ box }) => box.ascent)),
    descent: Math.max(0, ...placed.map(({ box }) => box.descent)),
    draw: (left, baseline) => placed.forEach(({ box, x: offset }) => box.draw(left + offset, baseline)),
  };
}

function isFence({ name, attributes }: MathNode): boolean {
  return name === "mo" && attributes.fence === "true";
}

function roomAround(nodes: readonly MathNode[], index: number, size: number): readonly [number, number] {
  const { name, text } = nodes[index];
  if (name === "mi" && [...text].length > 1) return [size * 0.1, size * 0.12];
  if (name !== "mo") return [0, 0];
  if (RELATIONS.has(text)) return [size * 0.26, size * 0.26];
  const before = nodes[index - 1];
  const unary = before === undefined || (before.name === "mo" && !/[)\]}]/.test(before.text));
  if (BINARY.has(text) && !unary) return [size * 0.18, size * 0.18];
  return text === "," ? [0, size * 0.16] : [0, 0];
}

/** A bracket as tall as the row; drawn by lines, since a typeface has it in one height only. */
function fence(
  pen: Pen,
  sign: string,
  { ascent, descent }: { readonly ascent: number; readonly descent: number },
  size: number,
): Box {
  if (sign === "") return empty();
  if (ascent + descent < size * 1.15) {
    return letters(pen, { name: "mo", text: sign, attributes: {}, children: [] }, size);
  }
  const width = size * 0.4;
  const draw = (x: number, baseline: number): void => {
    const [top, bottom, middle] = [baseline - ascent, baseline + descent, baseline + (descent - ascent) / 2];
    const [near, far] = [x + width * 0.25, x + width * 0.8];
    const { doc } = pen;
    if (sign === "(" || sign === ")") {
      const [a, b] = sign === "(" ? [far, near] : [near, far];
      const c = b + (b - a) * 0.2;
      doc.moveTo(a, top);
      doc.bezierCurveTo(c, top + (middle - top) * 0.6, c, bottom - (bottom - middle) * 0.6, a, bottom);
    } else if (sign === "[" || sign === "]") {
      const [a, b] = sign === "[" ? [far, near] : [near, far];
      doc.moveTo(a, top).lineTo(b, top).lineTo(b, bottom).lineTo(a, bottom);
    } else if (sign === "{" || sign === "}") {
      const [a, b] = sign === "{" ? [far, near] : [near, far];
      const c = (a + b) / 2;
      doc.moveTo(a, top).quadraticCurveTo(c, top, c, (top + middle) / 2);
      doc.quadraticCurveTo(c, middle, b, middle).quadraticCurveTo(c, middle, c, (middle + bottom) / 2);
      doc.quadraticCurveTo(c, bottom, a, bottom);
    } else doc.moveTo((near + far) / 2, top).lineTo((near + far) / 2, bottom);
    doc
      .lineWidth(size * 0.055)
      .strokeColor(INK)
      .stroke();
  };
  return { width: width * 1.05, ascent, descent, draw };
}

function fraction(pen: Pen, top: Box, bottom: Box, size: number): Box {
  const axis = size * 0.25;
  const gap = size * 0.16;
  const width = Math.max(top.width, bottom.width) + size * 0.2;
  return {
    width: width + size * 0.1,
    ascent: axis + gap + top.descent + top.ascent,
    descent: gap - axis + bottom.ascent + bottom.descent,
    draw: (x, baseline) => {
      const left = x + size * 0.05;
      const line = baseline - axis;
      top.draw(left + (width - top.width) / 2, line - gap - top.descent);
      bottom.draw(left + (width - bottom.width) / 2, line + gap + bottom.ascent);
      pen.doc
        .moveTo(left, line)
        .lineTo(left + width, line)
        .lineWidth(size * 0.05)
        .strokeColor(INK)
        .stroke();
    },
  };
}

function root(pen: Pen, inner: Box, size: number): Box {
  const lead = size * 0.55;
  const over = size * 0.14;
  return {
    width: lead + inner.width + size * 0.12,
    ascent: inner.ascent + over + size * 0.06,
    descent: inner.descent,
    draw: (x, baseline) => {
      const top = baseline - inner.ascent - over;
      const bottom = baseline + inner.descent;
      const height = bottom - top;
      pen.doc
        .moveTo(x + size * 0.05, bottom - height * 0.42)
        .lineTo(x + size * 0.18, bottom - height * 0.48)
        .lineTo(x + size * 0.32, bottom)
        .lineTo(x + lead - size * 0.06, top)
        .lineTo(x + lead + inner.width + size * 0.08, top)
        .lineWidth(size * 0.055)
        .strokeColor(INK)
        .stroke();
      inner.draw(x + lead, baseline);
    },
  };
}

function scripts(base: Box, sub: Box | null, sup: Box | null, size: number): Box {
  const drop = Math.max(size * 0.22, base.descent - size * 0.08);
  const rise = Math.max(size * 0.38, base.ascent - size * 0.36);
  const width = Math.max(sub?.width ?? 0, sup?.width ?? 0);
  return {
    width: base.width + width + size * 0.05,
    ascent: Math.max(base.ascent, sup ? rise + sup.ascent : 0),
    descent: Math.max(base.descent, sub ? drop + sub.descent : 0),
    draw: (x, baseline) => {
      base.draw(x, baseline);
      sub?.draw(x + base.width + size * 0.02, baseline + drop);
      sup?.draw(x + base.width + size * 0.04, baseline - rise);
    },
  };
}

function overlined(pen: Pen, inner: Box, size: number): Box {
  return {
    ...inner,
    ascent: inner.ascent + size * 0.12,
    draw: (x, baseline) => {
      inner.draw(x, baseline);
      const y = baseline - inner.ascent - size * 0.05;
      pen.doc
        .moveTo(x, y)
        .lineTo(x + inner.width, y)
        .lineWidth(size * 0.05)
        .strokeColor(INK)
        .stroke();
    },
  };
}

function table(pen: Pen, { children }: MathNode, size: number): Box {
  const rows = children.map((row) => row.children.map((cell) => rowBox(pen, cell.children, size)));
  const columns = Math.max(...rows.map((row) => row.length));
  const widths = Array.from({ length: columns }, (_, k) =>
    Math.max(...rows.map((row) => row[k]?.width ?? 0)),
  );
  const gap = size * 0.35;
  const heights = rows.map((row) => ({
    ascent: Math.max(...row.map(({ ascent }) => ascent)),
    descent: Math.max(...row.map(({ descent }) => descent)),
  }));
  const total = heights.reduce((sum, { ascent, descent }) => sum + ascent + descent, gap * (rows.length - 1));
  const ascent = total / 2 + size * 0.25;
  return {
    width: widths.reduce((sum, width) => sum + width, size * (columns - 1)),
    ascent,
    descent: total - ascent,
    draw: (x, baseline) => {
      let y = baseline - ascent;
      rows.forEach((row, index) => {
        let left = x;
        row.forEach((cell, k) => {
          cell.draw(left, y + heights[index].ascent);
          left += widths[k] + size;
        });
        y += heights[index].ascent + heights[index].descent + gap;
      });
    },
  };
}
