import type { Block, Column, Fact, RecordStep, Section } from "../_content/content";
import { formula, formulaHeight } from "./formula";
import { INK, lineStep, type Pen, RULE, SOFT, type TextStyle } from "./pen";

const TEXT: TextStyle = { face: "text", size: 9 };
const NUMBER: TextStyle = { face: "number", size: 8.4 };
const LABEL: TextStyle = { face: "text", size: 9, colour: SOFT };
const NOTE: TextStyle = { face: "text", size: 8, colour: SOFT };
const CODE: TextStyle = { face: "number", size: 7 };
const HEADING: TextStyle = { face: "strong", size: 11.5 };

/** One section under its title; the title never stands alone at the foot of a page. */
export function drawSection(pen: Pen, { title, blocks }: Section): void {
  pen.keep(34 + leadHeight(blocks[0]));
  pen.y += 10;
  pen.line(title, pen.left, pen.y + 10, HEADING);
  pen.y += 15;
  pen.rule();
  pen.y += 5;
  blocks.forEach((block, index) => {
    if (index > 0) pen.y += 6;
    drawBlock(pen, block);
  });
}

/** Height that a block takes at least before a page may end in it; rather more than less. */
function leadHeight(block: Block | undefined): number {
  if (block?.kind !== "table") return block?.kind === "steps" ? 60 : 30;
  return Math.min(block.rows.length * 26 + 18, KEPT_WHOLE);
}

function drawBlock(pen: Pen, block: Block): void {
  switch (block.kind) {
    case "facts":
      return drawFacts(pen, block.facts);
    case "table":
      drawTable(pen, block.columns, block.rows);
      if (block.remark) pen.paragraph(block.remark, NOTE);
      return;
    case "lines":
      return block.lines.forEach((line) => drawItem(pen, line));
    case "paragraph":
      return pen.paragraph(block.text.replaceAll("`", ""), TEXT);
    case "law":
      return formula(pen, block.tex, 11.5, pen.left, pen.width);
    case "steps":
      return block.steps.forEach((step, index) => drawStep(pen, step, index));
    case "code":
      return pen.paragraph(
        block.text.replace(/^ +/gm, (indent) => "\u00a0".repeat(indent.length)),
        CODE,
      );
  }
}

/** A line of a list, its mark hanging. */
export function drawItem(pen: Pen, text: string, indent = 10): void {
  const lines = pen.lines(text, pen.width - indent, TEXT);
  const step = lineStep(TEXT);
  pen.keep(Math.min(lines.length, 4) * step);
  lines.forEach((line, index) => {
    pen.keep(step);
    if (index === 0) pen.line("–", pen.left, pen.y + step * 0.76, TEXT);
    pen.line(line, pen.left + indent, pen.y + step * 0.76, TEXT);
    pen.y += step;
  });
}

function drawFacts(pen: Pen, facts: readonly Fact[]): void {
  const names = Math.min(150, Math.max(...facts.map(({ name }) => pen.widthOf(name, LABEL))) + 14);
  for (const { name, value, note } of facts) {
    const width = pen.width - names;
    const lines = pen.lines(value, width, TEXT);
    const notes = note ? pen.lines(note, width, NOTE) : [];
    const beside =
      note !== undefined &&
      lines.length === 1 &&
      notes.length === 1 &&
      pen.widthOf(value, TEXT) + 8 + pen.widthOf(note, NOTE) <= width;
    const step = lineStep(TEXT);
    pen.keep((lines.length + (beside ? 0 : notes.length)) * step);
    pen.line(name, pen.left, pen.y + step * 0.76, LABEL);
    lines.forEach((line) => {
      const end = pen.line(line, pen.left + names, pen.y + step * 0.76, TEXT);
      if (beside) pen.line(notes[0], end + 8, pen.y + step * 0.76, NOTE);
      pen.y += step;
    });
    if (beside) continue;
    for (const line of notes) {
      pen.line(line, pen.left + names, pen.y + step * 0.7, NOTE);
      pen.y += lineStep(NOTE);
    }
  }
}

/** A table lower than this is not spread over two pages, points. */
const KEPT_WHOLE = 160;

function drawTable(pen: Pen, columns: readonly Column[], rows: readonly (readonly string[])[]): void {
  const total = columns.reduce((sum, { weight = 1 }) => sum + weight, 0);
  const widths = columns.map(({ weight = 1 }) => (weight / total) * pen.width);
  const gap = 8;
  const head = (): void => {
    const step = lineStep(NOTE);
    const cells = columns.map(({ title }, index) => pen.lines(title, widths[index] - gap, NOTE));
    const height = Math.max(...cells.map((lines) => lines.length)) * step;
    drawCells(
      pen,
      cells,
      widths,
      columns.map(() => NOTE),
    );
    pen.y += height + 2;
  };
  const styles = columns.map(({ numeric }) => (numeric ? NUMBER : TEXT));
  const set = rows.map((row) => {
    const cells = row.map((cell, index) => pen.lines(cell, widths[index] - gap, styles[index]));
    const height = Math.max(...cells.map((lines, index) => lines.length * lineStep(styles[index]))) + 4;
    return { cells, height };
  });
  const whole = set.reduce((sum, { height }) => sum + height, 16);
  pen.keep(whole < KEPT_WHOLE ? whole : 44);
  head();
  let page = pen.doc.bufferedPageRange().count;
  for (const { cells, height } of set) {
    pen.keep(height);
    if (pen.doc.bufferedPageRange().count !== page) {
      page = pen.doc.bufferedPageRange().count;
      head();
    }
    pen.doc
      .moveTo(pen.left, pen.y)
      .lineTo(pen.left + pen.width, pen.y)
      .lineWidth(0.4)
      .strokeColor(RULE)
      .stroke();
    pen.y += 2;
    drawCells(pen, cells, widths, styles);
    pen.y += height - 2;
  }
}

function drawCells(
  pen: Pen,
  cells: readonly (readonly string[])[],
  widths: readonly number[],
  styles: readonly TextStyle[],
): void {
  let x = pen.left;
  cells.forEach((lines, index) => {
    const step = lineStep(styles[index]);
    lines.forEach((line, place) => pen.line(line, x, pen.y + step * (place + 0.76), styles[index]));
    x += widths[index];
  });
}

const STEP_TITLES = 150;

function drawStep(pen: Pen, { title, tex, value }: RecordStep, index: number): void {
  const width = pen.width - STEP_TITLES;
  const lines = pen.lines(`${index + 1}  ${title}`, STEP_TITLES - 12, TEXT);
  const values = value ? pen.lines(value, width, NUMBER) : [];
  const height = Math.max(
    lines.length * lineStep(TEXT),
    formulaHeight(pen, tex, 10, width) + values.length * lineStep(NUMBER),
  );
  pen.keep(height + 4);
  const top = pen.y;
  lines.forEach((line, place) =>
    pen.line(line, pen.left, top + lineStep(TEXT) * (place + 0.76), { ...TEXT, colour: INK }),
  );
  formula(pen, tex, 10, pen.left + STEP_TITLES, width);
  for (const line of values) {
    pen.line(line, pen.left + STEP_TITLES, pen.y + lineStep(NUMBER) * 0.76, NUMBER);
    pen.y += lineStep(NUMBER);
  }
  pen.y = Math.max(pen.y, top + lines.length * lineStep(TEXT)) + 4;
}
