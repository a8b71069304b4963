import { inflateSync } from "node:zlib";

interface PdfObject {
  readonly head: string;
  readonly stream: string;
}

/** What the pages of a PDF of ours say, page by page, in the order in which it was written. */
export function pdfPages(pdf: Uint8Array): string[] {
  const objects = readObjects(Buffer.from(pdf).toString("latin1"));
  const pages = [...objects.values()].filter(({ head }) => /\/Type \/Page\b/.test(head));
  return pages.map((page) => {
    const resources = objects.get(reference(page.head, "Resources"))?.head ?? page.head;
    const fonts = new Map(
      [...(/\/Font <<([^>]*)>>/.exec(resources)?.[1] ?? "").matchAll(/\/(F\d+) (\d+) 0 R/g)].map(
        ([, name, id]) => [name, toUnicode(objects, Number(id))],
      ),
    );
    return pageText(objects.get(reference(page.head, "Contents"))?.stream ?? "", fonts);
  });
}

/** The document's own title, as a reader's window shows it. */
export function pdfTitle(pdf: Uint8Array): string {
  const text = Buffer.from(pdf).toString("latin1");
  const objects = readObjects(text);
  const info = objects.get(reference(/trailer\n<<.*?>>/s.exec(text)?.[0] ?? "", "Info"))?.head ?? "";
  const title = objects.get(reference(info, "Title"))?.head ?? "";
  const bytes = Buffer.from(title.slice(1, -1).replace(/\\(.)/gs, "$1"), "latin1");
  if (bytes[0] !== 0xfe || bytes[1] !== 0xff) return bytes.toString("latin1");
  return Buffer.from(bytes.subarray(2)).swap16().toString("utf16le");
}

function readObjects(text: string): Map<number, PdfObject> {
  const objects = new Map<number, PdfObject>();
  for (const [, id, body] of text.matchAll(/(?:^|\n)(\d+) 0 obj\n(.*?)\nendobj/gs)) {
    const at = body.indexOf("\nstream\n");
    const head = at < 0 ? body : body.slice(0, at);
    const raw = at < 0 ? "" : body.slice(at + 8, body.lastIndexOf("\nendstream"));
    const stream = /\/FlateDecode/.test(head)
      ? inflateSync(Buffer.from(raw, "latin1")).toString("latin1")
      : raw;
    objects.set(Number(id), { head, stream });
  }
  return objects;
}

function reference(head: string, name: string): number {
  return Number(new RegExp(`/${name} (\\d+) 0 R`).exec(head)?.[1] ?? Number.NaN);
}

/** Texts by glyph, from the table that lets a reader search and copy. */
function toUnicode(objects: ReadonlyMap<number, PdfObject>, font: number): ReadonlyMap<number, string> {
  const table = objects.get(reference(objects.get(font)?.head ?? "", "ToUnicode"))?.stream ?? "";
  const texts = new Map<number, string>();
  for (const [, from, , list] of table.matchAll(/<([0-9a-f]{4})> <([0-9a-f]{4})> \[(.*?)\]/gs)) {
    [...list.matchAll(/<([0-9a-f ]*)>/g)].forEach(([, hex], index) => {
      const bytes = Buffer.from(hex.replaceAll(" ", ""), "hex");
      texts.set(Number.parseInt(from, 16) + index, Buffer.from(bytes).swap16().toString("utf16le"));
    });
  }
  return texts;
}

function pageText(content: string, fonts: ReadonlyMap<string, ReadonlyMap<number, string>>): string {
  let text = "";
  let font: ReadonlyMap<number, string> = new Map();
  for (const [, name, shown] of content.matchAll(/\/(F\d+) [\d.]+ Tf|\[((?:<[0-9a-f]+>|[-\d. ]+)*)\] TJ/g)) {
    if (name !== undefined) font = fonts.get(name) ?? new Map();
    else {
      for (const [, hex] of (shown ?? "").matchAll(/<([0-9a-f]+)>/g)) {
        for (let k = 0; k < hex.length; k += 4)
          text += font.get(Number.parseInt(hex.slice(k, k + 4), 16)) ?? "";
      }
    }
  }
  return text;
}
