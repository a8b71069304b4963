import { describe, expect, test } from "vitest";
import { below, from } from "@/app/(site)/calculate/table/_model/join";
import { readBytes } from "@/app/(site)/calculate/table/_model/read-file";
import { importText } from "@/app/(site)/calculate/table/_model/import-text";
import { outcomeOf, readItems, toDownload, toSend } from "@/app/(site)/calculate/table/_model/send";
import { newRow, readTitle, startTable, withShape } from "@/app/(site)/calculate/table/_model/table";
import { tableVocabulary } from "@/app/(site)/calculate/table/_server/vocabulary";

const vocabulary = tableVocabulary();
const start = startTable(vocabulary, "bar");

async function taken(text: string) {
  const found = await importText(text, start, vocabulary);
  if (!found.ok) throw new Error(found.reason);
  return found;
}

describe("rows that come in", () => {
  test("titles by the API's names, by labels, with units in any of three forms", () => {
    const titles = [
      "width/mm",
      "Width [mm]",
      "width (mm)",
      "WIDTH",
      "core.material",
      "Sheet resistance",
      "nonsense",
      "",
    ];
    expect(titles.map((title) => readTitle(title, vocabulary))).toEqual([
      { name: "width", unit: "mm" },
      { name: "width", unit: "mm" },
      { name: "width", unit: "mm" },
      { name: "width", unit: "" },
      { name: "core.material", unit: "" },
      { name: "sheetResistance", unit: "" },
      null,
      null,
    ]);
  });

  test("semicolons with decimal commas, a mark in front, empty rows, results of an earlier answer", async () => {
    const text =
      "\uFEFFshape;length/m;width [mm];Remark;status\r\nbar;1,5;50;x;200\r\n;;;;\r\nbar;2,25;40;y;422\r\n";
    const { table, notes } = await taken(text);
    expect(table.columns.map(({ name, unit }) => [name, unit])).toEqual([
      ["shape", ""],
      ["length", "m"],
      ["width", "mm"],
      ["", ""],
    ]);
    expect(table.rows.map(({ cells }) => cells)).toEqual([
      ["bar", "1,5", "50", "x"],
      ["bar", "2,25", "40", "y"],
    ]);
    expect([table.decimalComma, table.delimiter]).toEqual([true, ";"]);
    expect(notes).toEqual([
      "One column is left out until its head says what it is. “Remark” is not known.",
      "One empty row between the others is left out.",
    ]);
  });

  test("rows without a header take the columns that are there", async () => {
    const { table } = await taken("bar\t1 m\t2 mm\t3 mm\tcopper-annealed\nbar\t4 m\t5 mm\t6 mm\taluminium");
    expect(table.columns).toEqual(start.columns);
    expect(table.rows).toHaveLength(2);
    expect(await importText("1\t2\n3\t4", start, vocabulary)).toMatchObject({ headed: false, shaped: false });
  });

  test.each([
    ["  ", "There is nothing in it."],
    ["\uFEFF", "There is nothing in it."],
    ["shape,length\n", "There is a header and no row below it."],
    [
      "name,lenght\nAnna,5\n",
      "No column of it is known here. “name” is not known. “lenght” is not known. Did you mean",
    ],
    ['shape,length\nbar,"5 m\nbar,6 m\n', "Row 2 has a quote that is not closed"],
    [
      "shape,length,width\nbar,1,5,50\n",
      "Row 2 has 4 cells where the header names 3 columns. Where commas are decimal",
    ],
    [`shape,length\n${"bar,1 m\n".repeat(10_001)}`, "It has more than 10,000 rows"],
  ])("%# is refused with what is wrong", async (text, reason) => {
    const found = await importText(text, start, vocabulary);
    expect(found.ok ? "" : found.reason).toContain(reason);
  });

  test("unknown and repeated names are told with the nearest known one; a missing shape can be put in", async () => {
    const found = await taken("Lenght [m],width/mm,thickness,width\n1,2,3,4\n");
    expect(found.notes[0]).toContain('“Lenght [m]” is not known. Did you mean "length"');
    expect(found.notes[0]).toContain("“width” names width again.");
    expect([found.shaped, found.likely]).toEqual([false, "bar"]);
    const shaped = withShape(found.table, "bar");
    expect(shaped.rows[0].cells).toEqual(["bar", "1", "2", "3", "4"]);
    expect(shaped.columns[0].name).toBe("shape");
  });

  test("rows go below others with the unit that they had, or over cells from one on", async () => {
    const { table } = await taken("shape;width/mm;length/m;label\nbar;1,5;2;a\n");
    const more = await taken("label,shape,width,thickness/mm\nb,bar,0.25,3\nc,bar,4 cm,5\n");
    const joined = below(table, more.table, vocabulary);
    if (!joined.ok) throw new Error(joined.reason);
    expect(joined.table.columns.map(({ name }) => name)).toEqual([
      "shape",
      "width",
      "length",
      "label",
      "thickness",
    ]);
    // A bare width of the other file is in metres, and this table writes decimal commas.
    expect(joined.table.rows.map(({ cells }) => cells)).toEqual([
      ["bar", "1,5", "2", "a"],
      ["bar", "0,25 m", "", "b", "3"],
      ["bar", "4 cm", "", "c", "5"],
    ]);

    const block = await importText("7\t8\n9\t10", table, vocabulary);
    const filled = block.ok ? from(table, block.table, 0, 1, vocabulary) : block;
    expect(filled.ok && filled.table.rows.map(({ cells }) => cells)).toEqual([
      ["bar", "7", "8", "a"],
      ["", "9", "10", ""],
    ]);

    const many = { ...table, rows: Array.from({ length: 9_999 }, () => newRow(["bar"])) };
    expect(below(many, more.table, vocabulary)).toEqual({
      ok: false,
      reason: "Together they are 10,001 rows; a table takes at most 10,000.",
    });
  });
});

describe("a file that is uploaded", () => {
  const bytes = (...parts: readonly (number | string)[]) =>
    Uint8Array.from(parts.flatMap((part) => (typeof part === "number" ? [part] : [...Buffer.from(part)])));

  test.each([
    [bytes(0x89, "PNG\r\n", 0x1a, 0x0a), "a PNG picture"],
    [bytes("PK", 3, 4, 0, 0), "a workbook; save its sheet as"],
    [bytes("%PDF-1.7"), "a PDF"],
    [bytes(1, 2, 0, 3, 0x81), "no text"],
    [bytes('{"items":[]}'), "JSON, which POST /resistance/batch takes"],
    [bytes("<svg xmlns=''/>"), "a page or a drawing in markup"],
  ])("%# is refused by what it is", (content, what) => {
    const reading = readBytes(content, "x.csv");
    expect(reading.ok ? "" : reading.reason).toContain(`“x.csv” is ${what}`);
  });

  test("is taken in UTF-8, in a spreadsheet's UTF-16, and with a word of caution in Windows-1252", () => {
    expect(readBytes(bytes("shape,µ"), "a.csv")).toEqual({ ok: true, text: "shape,µ", note: null });
    const wide = Uint8Array.from([0xff, 0xfe, ...Buffer.from("shape\tΩ", "utf16le")]);
    expect(readBytes(wide, "a.txt")).toEqual({ ok: true, text: "shape\tΩ", note: null });
    const western = readBytes(bytes("shape;35 ", 0xb5, "m"), "a.csv");
    expect(western).toMatchObject({ ok: true, text: "shape;35 µm" });
    expect(western.ok && western.note).toContain("“a.csv” is not in UTF-8. It was read as Windows-1252");
  });
});

describe("rows that go out", () => {
  test("are in the API's spelling; columns that are left out and empty rows do not go", async () => {
    const { table } = await taken("shape;length/m;width;Remark;label\nbar;1,5;50 mm;=1;1,5\n");
    const { body, rows, places } = await toSend(table, table.rows, vocabulary);
    expect(body).toBe('shape,length/m,width,label\nbar,1.5,50 mm,"1,5"');
    expect(rows).toEqual([table.rows[0]]);
    expect(places).toEqual([0, 1, 2, 4]);
  });

  test("every shape's start is a table that the API knows the columns of", async () => {
    for (const { id } of vocabulary.shapes) {
      const table = startTable(vocabulary, id);
      expect(
        table.columns.every(({ name }) => vocabulary.columns.some((column) => column.name === name)),
        id,
      ).toBe(true);
    }
  });
});

describe("what comes back", () => {
  test("is read line by line, wherever the pieces break", async () => {
    const text =
      '{"items":[\n{"index":0,"status":200,"result":{"resistance":{"value":1,"lower":0.9,"upper":1.1,"text":"1 Ω"}}},\n{"index":1,"status":422,"problem":{"detail":"#","errors":[{"pointer":"#/media/core/material","detail":"is required."}]}}\n],"counts":{}}\n';
    const bytes = new TextEncoder().encode(text);
    const pieces = new ReadableStream<Uint8Array>({
      start(controller) {
        for (let k = 0; k < bytes.length; k += 7) controller.enqueue(bytes.slice(k, k + 7));
        controller.close();
      },
    });
    const outcomes: unknown[] = [];
    await readItems(new Response(pieces), (items) => outcomes.push(...items.map(outcomeOf)));
    expect(outcomes).toEqual([
      { ok: true, value: 1, lower: 0.9, upper: 1.1, text: "1 Ω" },
      {
        ok: false,
        status: 422,
        later: false,
        atColumn: { "core.material": "is required." },
        text: "core.material is required.",
      },
    ]);
  });

  test("downloads with its results, and no cell is a formula", async () => {
    const { table } = await taken("shape,label\nbar,=1+1\n");
    const outcome = { ok: true, value: 1, lower: 0.5, upper: 2, text: "1 Ω" } as const;
    const text = await toDownload(table, new Map([[table.rows[0], outcome]]));
    expect(text).toBe(
      "\uFEFFshape,label,resistance/ohm,lower/ohm,upper/ohm,text,status,problem\r\nbar,'=1+1,1,0.5,2,1 Ω,200,\r\n",
    );
  });

  test("downloads with the decimal mark and the delimiter that it came with", async () => {
    const { table } = await taken("shape;width/mm;temperature;label\nbar;1,5;-40,5;=A1\nbar;0;;b\n");
    const [first, second] = table.rows;
    const text = await toDownload(
      table,
      new Map([
        [first, { ok: true, value: 4.2e-5, lower: 0.5, upper: 1.25, text: "42.125 µΩ" }],
        [second, { ok: false, status: 422, later: false, atColumn: {}, text: "width must be positive." }],
      ]),
    );
    expect(text.split("\r\n").slice(1)).toEqual([
      "bar;1,5;-40,5;'=A1;0,000042;0,5;1,25;42,125 µΩ;200;",
      "bar;0;;b;;;;;422;width must be positive.",
      "",
    ]);
    const pointed = await taken("shape;width\nbar;1.5\n");
    expect((await toDownload(pointed.table, new Map())).split("\r\n")[1]).toBe("bar;1.5;;;;;;");
  });
});
