import { setTimeout } from "node:timers/promises";
import fc from "fast-check";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { csvTemplate } from "@/api/batch/csv-template";
import { defused } from "@/api/batch/defuse";
import { catalogue, exampleRequest } from "@/lib/engine";
import { call, expectProblem, places } from "../support/call";
import { startServer, type TestServer } from "../support/server";

let server: TestServer;
let key: string;
beforeAll(async () => {
  server = await startServer();
  key = server.issue().key;
});
afterAll(() => server.stop());

const CSV = { "Content-Type": "text/csv" };
const post = (body: unknown, headers: Record<string, string> = {}, as = key, to = server) =>
  call(to, "post", "/resistance/batch", { key: as, body, headers });
const bar = (width: unknown) => ({
  shape: "bar",
  dimensions: { length: "1.2 m", width, thickness: "10 mm" },
  medium: { material: "copper-annealed" },
});
const lines = (text: string) => text.trimEnd().split("\r\n");

describe("POST /resistance/batch 200", () => {
  test("every shape of the catalogue as by single calls, mistakes among them", async () => {
    const requests = [...catalogue.map(exampleRequest), bar("50 kg"), 5, { ...bar(1), shape: "barr" }, null];
    const { status, body } = await post({ items: requests });
    expect(status).toBe(200);
    expect(body.counts).toEqual({ answered: catalogue.length, refused: 4, notComputed: 0 });
    expect(body.items).toHaveLength(requests.length);
    for (const [index, request] of requests.entries()) {
      const single = await call(server, "post", "/resistance", { key, body: JSON.stringify(request) });
      const item = body.items[index];
      expect([item.index, item.status]).toEqual([index, single.status]);
      if (single.status === 200) expect(item.result).toEqual(single.body);
      else {
        const { instance: _, ...problem } = item.problem;
        const { instance: __, ...alone } = single.body;
        expect(problem).toEqual(alone);
      }
    }
  });

  test("an item stores no record and says so", async () => {
    const { body } = await post({ items: [{ ...bar("1 mm"), record: { label: "No" } }] });
    expect(body.items[0].problem.errors[0].pointer).toBe("#/record");
  });

  test("none at all", async () => {
    expect((await post({ items: [] })).body).toEqual({
      items: [],
      counts: { answered: 0, refused: 0, notComputed: 0 },
    });
    expect(lines((await post("shape,length\n", CSV)).text)).toHaveLength(1);
  });

  test("only what is answered counts, and the rest of the reservation is given back", async () => {
    const { key: own } = server.issue({ quotas: { minute: 100, month: 11 } });
    for (let round = 0; round < 3; round++) {
      const answer = await post({ items: [bar("1 mm"), ...new Array(8).fill(bar("1 kg"))] }, {}, own);
      expect(answer.body.counts).toMatchObject({ answered: 1, refused: 8 });
    }
    const { body } = await call(server, "get", "/usage", { key: own });
    expect(body.month.remaining).toBe(8);
    expect(body.byDay[0]).toMatchObject({ requests: 3, computations: 3, refused: 0 });
  });

  test("items that do not fit into the batch's time are told, and cost nothing", async () => {
    const hasty = await startServer({ RHOFORM_BATCH_SECONDS: "0.01" });
    try {
      const { key: own } = hasty.issue({ quotas: { minute: 100, month: 10_000 } });
      const { body } = await post({ items: new Array(5_000).fill(bar("1 mm")) }, {}, own, hasty);
      const { answered, notComputed } = body.counts;
      expect(answered).toBeGreaterThan(0);
      expect(notComputed).toBe(5_000 - answered);
      const last = body.items[4_999];
      expect([last.index, last.status, last.problem.type.split("/").pop()]).toEqual([
        4_999,
        503,
        "not-computed",
      ]);
      expect(last.problem.detail).toContain("0.01 s");
      const usage = await call(hasty, "get", "/usage", { key: own });
      expect(usage.body.month.remaining).toBe(10_000 - answered);
    } finally {
      await hasty.stop();
    }
  });

  test("other calls are answered while a large batch is at work", async () => {
    let atWork = true;
    const large = post({ items: new Array(10_000).fill(bar("1 mm")) }).finally(() => (atWork = false));
    let between = 0;
    while (atWork) {
      expect((await call(server, "get", "/health")).status).toBe(200);
      if (atWork) between += 1;
      await setTimeout(20);
    }
    expect((await large).body.counts.answered).toBe(10_000);
    // Reading 2 MB of JSON is one stretch; apart from it the loop is never kept long.
    expect(between).toBeGreaterThan(5);
  });
});

describe("POST /resistance/batch refused whole", () => {
  test("429 before any work where the month does not suffice, with what is left", async () => {
    const { key: own } = server.issue({ quotas: { minute: 100, month: 3 } });
    const refused = await post({ items: new Array(4).fill(bar("1 mm")) }, {}, own);
    expectProblem(refused, 429, "quota-exhausted");
    expect(refused.body.title).not.toContain("used up");
    expect(refused.body.detail).toContain(
      "needs 4 computations; 3 of this month's 3 are left until the quota starts anew at ",
    );
    expect((await post({ items: new Array(3).fill(bar("1 mm")) }, {}, own)).status).toBe(200);
  });

  test("413 for more than 10,000 items, as JSON and as a table", async () => {
    for (const answer of [
      await post({ items: new Array(10_001).fill(1) }),
      await post(`shape,length\n${"bar,1\n".repeat(1_000_000)}`, CSV),
    ]) {
      expectProblem(answer, 413, "body-too-large");
      expect(answer.body.detail).toContain("at most 10,000 items");
    }
    const large = await post(`shape,label\n${`bar,${"x".repeat(4_000)}\n`.repeat(5_100)}`, CSV);
    expectProblem(large, 413, "body-too-large");
    expect(large.body.detail).toContain("20,000,000 bytes");
  });

  test("422 without items, 400 for no JSON, 415, 406", async () => {
    expect(places(await post({}))).toEqual(["#/items"]);
    expect(places(await post({ items: 5 }))).toEqual(["#/items"]);
    expect(places(await post([]))).toEqual(["#"]);
    expect(places(await post({ items: [], label: 1 }))).toEqual(["#/label"]);
    expectProblem(await post("{"), 400, "malformed-json");
    expectProblem(await post("a", { "Content-Type": "text/plain" }), 415, "unsupported-media-type");
    expectProblem(await post({ items: [] }, { Accept: "text/html" }), 406, "not-acceptable");
  });
});

describe("CSV in and out", () => {
  test("the same rows and columns with what came out behind them", async () => {
    const table = [
      "shape,length,width/mm,thickness/mm,material,temperature,label",
      'bar,1.2 m,50,10,copper-annealed,75,"Riser, rev ""C"""',
      "bar,1.2 m,0.5 in,10,copper-annealed,-40 degC,Cold",
      ",,,,,,",
      "bar,1.2 m,50,10 kg,copper-annealed,75,Misread",
      "",
      "",
    ].join("\r\n");
    const { status, text, headers } = await post(table, CSV);
    expect([status, headers["content-type"]]).toEqual([200, "text/csv; charset=utf-8"]);
    const [header, first, second, third, fourth, ...rest] = lines(text);
    expect(rest).toEqual([]);
    const added = "resistance/ohm,lower/ohm,upper/ohm,text,status,problem";
    expect(header).toBe(`shape,length,width/mm,thickness/mm,material,temperature,label,${added}`);
    const single = await call(server, "post", "/resistance", {
      key,
      body: { ...bar("50 mm"), operating: { temperature: 75 } },
    });
    const { value, lower, upper, text: shown } = single.body.resistance;
    expect(first).toBe(
      `bar,1.2 m,50,10,copper-annealed,75,"Riser, rev ""C""",${value},${lower},${upper},${shown},200,`,
    );
    expect(second).toMatch(/^bar,1\.2 m,0\.5 in,10,copper-annealed,-40 degC,Cold,.*,200,$/);
    expect(third).toBe(",".repeat(12));
    expect(fourth).toMatch(/,Misread,,,,,422,"thickness must be a length/);
    // An answer can be sent again: its results are made anew.
    expect((await post(text, CSV)).text).toBe(text);
  });

  test("semicolons, a byte order mark, tabs and decimal commas", async () => {
    const table = (delimiter: string, mark = "") =>
      mark +
      ["shape;length;width;thickness;resistivity", "bar;1;2;3;4", "bar;1,5 m;2;3;4"]
        .join("\n")
        .replaceAll(";", delimiter);
    const semicolons = await post(table(";", "\uFEFF"), CSV);
    expect(semicolons.text.startsWith("\uFEFFshape;length;")).toBe(true);
    expect(lines(semicolons.text)[1]).toMatch(/^bar;1;2;3;4;0\.66666/);
    expect(lines(semicolons.text)[2]).toContain("decimal comma");
    expect(lines((await post(table("\t"), CSV)).text)[1]).toMatch(/^bar\t1\t2\t3\t4\t0\.66666/);
    const commas = await post(table(","), CSV);
    expect(lines(commas.text)[2]).toContain("422,has 6 cells; the header names 5 columns.");
  });

  test("every complaint about the header at once", async () => {
    const answer = await post("lenght,width/kg,material/mm,width,,Temperature\n1,1,1,1,7,1\n", CSV);
    expectProblem(answer, 422, "invalid-input");
    expect(places(answer)).toEqual([
      "#/header",
      "#/header/0",
      "#/header/1",
      "#/header/2",
      "#/header/4",
      "#/header/5",
    ]);
    expect(JSON.stringify(answer.body.errors)).toContain('Did you mean \\"temperature\\"?');
  });

  test("an empty file, blanks only, an open quote, a file that is not UTF-8", async () => {
    expect(places(await post("", CSV))).toEqual(["#"]);
    expect(places(await post("\n \n", CSV))).toEqual(["#"]);
    expect((await post('shape,label\nbar,"open\n', CSV)).body.detail).toContain("quote in row 2");
    const bytes = async (body: Buffer) => {
      const answer = await fetch(`${server.base}/api/v1/resistance/batch`, {
        method: "POST",
        headers: { Authorization: `Bearer ${key}`, ...CSV },
        body: new Uint8Array(body),
      });
      const { title, detail } = await answer.json();
      return [answer.status, title, detail];
    };
    const title = "The body cannot be read";
    const remedy = "Save or send it as UTF-8.";
    expect(await bytes(Buffer.from("shape,label\nbar,\xb5\n", "latin1"))).toEqual([
      400,
      title,
      `The body is not UTF-8: byte 17 (0xB5, in line 2) is part of no character. ${remedy}`,
    ]);
    const shown = Buffer.concat([Buffer.from("shape,\uFFFD\uFFFD\n"), Buffer.from([0xd9])]);
    expect((await bytes(shown))[2]).toContain("byte 14 (0xD9, in line 2)");
    const wide = [400, title, `The body is not UTF-8: it looks like UTF-16. ${remedy}`];
    expect(await bytes(Buffer.from("\uFEFFshape,label\nbar,µ\n", "utf16le"))).toEqual(wide);
    expect(await bytes(Buffer.from("shape,label\nbar,x\n", "utf16le"))).toEqual(wide);
    expect(await bytes(Buffer.from("shape,label\nbar,x\n", "utf16le").swap16())).toEqual(wide);
  });

  test("a table answered as JSON, and items answered as a table", async () => {
    const json = await post("shape,length,width,thickness,resistivity\nbar,1,1,1,1\n", {
      ...CSV,
      Accept: "application/json",
    });
    expect(json.body.items[0].result.resistance.value).toBe(1);
    const table = await post({ items: [bar("50 mm"), bar("50 kg")] }, { Accept: "text/csv" });
    expect(lines(table.text)[0]).toBe("index,resistance/ohm,lower/ohm,upper/ohm,text,status,problem");
    expect(lines(table.text)[2]).toMatch(/^1,,,,,422,"width must be/);
  });

  test("the template of every shape is answered without complaint", async () => {
    for (const shape of catalogue) {
      const { status, text } = await post(csvTemplate(shape), CSV);
      expect([shape.id, status]).toEqual([shape.id, 200]);
      const graded = /,"?(medium|media) /.test(lines(text)[1]);
      if (!graded) expect(lines(text)[1], shape.id).toMatch(/,200,$/);
    }
  });
});

describe("cells that a spreadsheet would take for a formula", () => {
  test("get an apostrophe in front; numbers and quantities with a sign do not", () => {
    for (const cell of [
      "=1+1",
      "+cmd|' /C calc'!A0",
      "-2+3",
      "@SUM(A1)",
      "\t=1",
      "\r=1",
      " =1",
      "＝1",
      "-A1",
      '=HYPERLINK("x")',
    ])
      expect(defused(cell)).toBe(`'${cell}`);
    for (const cell of ["-40", "-12,5", "+1.5e-3", "-40 degC", "-5 %", "-.5", "a=b", "", "1.72e-8 ohm m"])
      expect(defused(cell)).toBe(cell);
  });

  test("whatever is typed: a cell that begins like a formula is a number or is defused", () => {
    const anything = fc.oneof(fc.string(), fc.stringMatching(/^[\s=+\-@]{1,3}[A-Z0-9(!|.]{0,8}$/));
    fc.assert(
      fc.property(anything, (cell) => {
        const out = defused(cell);
        expect(out.endsWith(cell)).toBe(true);
        if (/^\s*[=@]/.test(out)) throw new Error(`${JSON.stringify(out)} begins like a formula`);
        if (/^\s*[+-]/.test(out)) expect(out).toMatch(/^[+-]?[\d.]/);
      }),
      { seed: 8, numRuns: 500 },
    );
  });

  test("also in labels of an answer", async () => {
    const { text } = await post("shape,length,width,thickness,resistivity,label\nbar,1,1,1,1,=1+1\n", CSV);
    expect(lines(text)[1]).toContain(",'=1+1,");
  });
});
