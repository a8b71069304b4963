import { describe, expect, test } from "vitest";
import { importText } from "@/app/(site)/calculate/table/_model/import-text";
import { outcomeOf, readItems, toDownload, toSend } from "@/app/(site)/calculate/table/_model/send";
import { readTitle, startTable } from "@/app/(site)/calculate/table/_model/table";
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
    const { table, unknown } = await taken(text);
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
    expect([table.decimalComma, unknown]).toEqual([true, 1]);
  });

  test("rows without a header take the columns that are there", async () => {
    const { table } = await taken("bar\t1 m\t2 mm\t3 mm\tcopper-annealed\nbar\t4 m\t5 mm\t6 mm\taluminium");
    expect(table.columns).toEqual(start.columns);
    expect(table.rows).toHaveLength(2);
    expect(await importText("  ", start, vocabulary)).toMatchObject({ ok: false });
    expect(await importText("shape,length\n", start, vocabulary)).toMatchObject({ ok: false });
  });
});

describe("rows that go out", () => {
  test("are in the API's spelling; columns that are left out and empty rows do not go", async () => {
    const { table } = await taken("shape;length/m;width;Remark;label\nbar;1,5;50 mm;=1;1,5\n");
    const { body, ids } = await toSend(table, table.rows, vocabulary);
    expect(body).toBe('shape,length/m,width,label\nbar,1.5,50 mm,"1,5"');
    expect(ids).toEqual([table.rows[0].id]);
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
        atColumn: { "core.material": "is required." },
        text: "core.material is required.",
      },
    ]);
  });

  test("downloads with its results, and no cell is a formula", async () => {
    const { table } = await taken("shape,label\nbar,=1+1\n");
    const outcome = { ok: true, value: 1, lower: 0.5, upper: 2, text: "1 Ω" } as const;
    const text = await toDownload(table, new Map([[table.rows[0].id, outcome]]));
    expect(text).toBe(
      "\uFEFFshape,label,resistance/ohm,lower/ohm,upper/ohm,text,problem\r\nbar,'=1+1,1,0.5,2,1 Ω,\r\n",
    );
  });
});
