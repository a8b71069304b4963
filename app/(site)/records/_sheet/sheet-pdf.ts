import "server-only";
import type { Headline, RecordContent } from "../_content/content";
import { INK, lineStep, MARGIN, type Paper, Pen, SOFT, type TextStyle } from "./pen";
import { drawPicture } from "./picture";
import { drawItem, drawSection } from "./sheet-blocks";

const SMALL: TextStyle = { face: "text", size: 8, colour: SOFT };
const TEXT: TextStyle = { face: "text", size: 9 };
const TONES = { met: "#1F6F62", "not-met": "#A8261C", undecided: "#8A5A00" } as const;
const WORDS = {
  met: "Requirement met.",
  "not-met": "Requirement not met.",
  undecided: "Requirement undecided.",
} as const;
const AMBER = "#8A5A00";

/** The printed sheet of a record as PDF: the same content as its page, in the same order. */
export async function sheetPdf(content: RecordContent, paper: Paper): Promise<Uint8Array<ArrayBuffer>> {
  const { label, code, address, subject, by, storedAt } = content;
  const pen = new Pen(paper, {
    Title: `${label} · ${code}`,
    Subject: `${subject}: ${content.headline.title} ${content.headline.text}`.trim(),
    Author: by,
    Keywords: address,
    Creator: "Rhoform",
    Producer: "Rhoform",
  });
  const done = collect(pen.doc);
  pen.paragraph(subject, SMALL);
  pen.paragraph(label, { face: "strong", size: 17 });
  pen.y += 2;
  const stored = `${storedAt.slice(0, 10)} ${storedAt.slice(11, 16)} UTC by ${by}`;
  const facts = [
    `Code ${code}`,
    `Stored ${stored}`,
    ...(content.team ? [`Team ${content.team}`] : []),
    `Engine ${content.engine}`,
  ];
  pen.paragraph(facts.join("   ·   "), SMALL);
  pen.paragraph(address, SMALL);
  pen.y += 5;
  pen.rule();
  pen.y += 8;
  drawHeadline(pen, content.headline);
  if (content.picture) {
    pen.y += 8;
    drawPicture(pen, content.picture);
  }
  if (content.cautions.length > 0) drawCautions(pen, content.cautions);
  for (const section of content.sections) drawSection(pen, section);
  drawEdges(pen, content);
  pen.doc.end();
  return done;
}

function collect(doc: PDFKit.PDFDocument): Promise<Uint8Array<ArrayBuffer>> {
  return new Promise((resolve, reject) => {
    const chunks: Buffer[] = [];
    doc.on("data", (chunk: Buffer) => chunks.push(chunk));
    doc.on("end", () => resolve(new Uint8Array(Buffer.concat(chunks))));
    doc.on("error", reject);
  });
}

function drawHeadline(pen: Pen, { title, text, bracket, statements, verdict }: Headline): void {
  pen.paragraph(title, { ...SMALL, size: 9 });
  if (text !== "") {
    const figure: TextStyle = { face: "figure", size: 19 };
    const small: TextStyle = { face: "number", size: 9 };
    const beside =
      bracket !== null && pen.widthOf(text, figure) + 14 + pen.widthOf(bracket, small) <= pen.width;
    const top = pen.y;
    pen.paragraph(text, figure);
    if (bracket && beside) {
      pen.line(bracket, pen.left + pen.widthOf(text, figure) + 14, top + lineStep(figure) * 0.76, small);
    } else if (bracket) pen.paragraph(bracket, small);
  }
  for (const statement of statements) pen.paragraph(statement, { ...TEXT, colour: SOFT });
  if (verdict) {
    pen.y += 3;
    const word: TextStyle = { face: "strong", size: 9.5, colour: TONES[verdict.outcome] };
    const step = lineStep(word);
    pen.keep(step);
    pen.doc.rect(pen.left, pen.y + 1, 2, step - 2).fill(TONES[verdict.outcome]);
    const end = pen.line(WORDS[verdict.outcome], pen.left + 8, pen.y + step * 0.76, word);
    pen.line(verdict.sentence, end + 5, pen.y + step * 0.76, { ...TEXT, colour: INK });
    pen.y += step;
  }
}

function drawCautions(pen: Pen, cautions: readonly string[]): void {
  pen.keep(50);
  pen.y += 8;
  pen.line(cautions.length > 1 ? "Cautions" : "Caution", pen.left, pen.y + 9, {
    face: "strong",
    size: 9.5,
    colour: AMBER,
  });
  pen.y += 14;
  for (const caution of cautions) drawItem(pen, caution);
}

/** Head and foot of every page, once it is known how many there are. */
function drawEdges(pen: Pen, { label, code, address }: RecordContent): void {
  const { doc } = pen;
  const { start, count } = doc.bufferedPageRange();
  for (let page = 0; page < count; page += 1) {
    doc.switchToPage(start + page);
    const foot = doc.page.height - MARGIN.bottom + 26;
    const number = `page ${page + 1} of ${count}`;
    pen.line(address, pen.left, foot, SMALL);
    pen.line(number, pen.left + pen.width - pen.widthOf(number, SMALL), foot, SMALL);
    const [name] = pen.lines(`Rhoform record · ${label}`, pen.width - 90, SMALL);
    pen.line(name, pen.left, 36, SMALL);
    pen.line(code, pen.left + pen.width - pen.widthOf(code, SMALL), 36, SMALL);
  }
}
