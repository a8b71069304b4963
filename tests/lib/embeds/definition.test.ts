import { describe, expect, test } from "vitest";
import { catalogue, exampleRequest, findShape, libraryMaterial } from "@/lib/engine";
import { definitionProblems } from "@/lib/embeds/check-definition";
import { accentContrasts, contrastOf } from "@/lib/embeds/contrast";
import {
  type EmbedDefinition,
  embedDefinition,
  embedSettings,
  type InputRule,
} from "@/lib/embeds/definition";
import { widgetRequest } from "@/lib/embeds/enforce";
import { inputsOf } from "@/lib/embeds/inputs";
import { speechOf } from "@/lib/embeds/language";
import { startDefinition } from "@/lib/embeds/start-definition";
import { readTolerance } from "@/lib/embeds/tolerances";
import { BUSBAR, definition } from "../../support/widget";

const problems = (change: Parameters<typeof definition>[0]) =>
  definitionProblems(definition(change), libraryMaterial).map(({ pointer }) => pointer);

const withRule = (name: string, rule: InputRule) => ({
  inputs: BUSBAR.inputs.map((input) => (input.name === name ? { name, rule } : input)),
});

describe("definitionProblems", () => {
  test("none for a definition that answers as it opens", () => {
    expect(problems({})).toEqual([]);
    expect(problems({ requirement: { max: "1 mohm" }, accent: "#9c4a1f", theme: "light" })).toEqual([]);
  });

  test("names the place of each mistake", () => {
    expect(problems({ shape: "cube" })).toEqual(["#/shape"]);
    expect(problems({ inputs: BUSBAR.inputs.filter(({ name }) => name !== "width") })).toEqual(["#/inputs"]);
    expect(problems(withRule("length", { mode: "open", value: "5 m", max: "4 m" }))).toEqual([
      "#/inputs/0/value",
    ]);
    expect(problems(withRule("length", { mode: "open", value: "1 m", min: "4 m", max: "4 kg" }))).toEqual([
      "#/inputs/0/max",
      "#/inputs/0/value",
    ]);
    expect(problems(withRule("width", { mode: "fixed", value: "0 mm" }))).toEqual(["#/inputs"]);
    expect(problems(withRule("material", { mode: "open", value: "silver" }))).toEqual(["#/inputs/3/choices"]);
    expect(problems({ requirement: { max: "5 kg" } })).toEqual(["#/requirement/max"]);
    expect(problems({ accent: "#ffff00", theme: "light" })).toEqual(["#/accent"]);
    expect(problems({ accent: "#101010", theme: "host" })).toEqual(["#/accent"]);
  });

  test("names the place of each mistake in a tolerance", () => {
    const found = (...inputs: NonNullable<EmbedDefinition["tolerances"]>["inputs"]) =>
      problems({ tolerances: { uncertainty: { method: "propagation" }, budget: true, inputs } });
    expect(found({ name: "width", rule: { mode: "fixed", value: "1 %" } })).toEqual([]);
    expect(found({ name: "temperature", rule: { mode: "open", value: "5 K", max: "10 K" } })).toEqual([]);
    expect(found({ name: "voltage", rule: { mode: "fixed", value: "1 %" } })).toEqual([
      "#/tolerances/inputs/0/name",
    ]);
    expect(found({ name: "material", rule: { mode: "fixed", value: "1 %" } })).toEqual([
      "#/tolerances/inputs/0/name",
    ]);
    expect(found({ name: "temperature", rule: { mode: "fixed", value: "1 %" } })).toEqual([
      "#/tolerances/inputs/0/value",
    ]);
    expect(
      found(
        { name: "width", rule: { mode: "open", value: "5 kg" } },
        { name: "length", rule: { mode: "open", value: "3 mm", min: "5 mm", max: "4 mm" } },
      ),
    ).toEqual(["#/tolerances/inputs/0/value", "#/tolerances/inputs/1/max", "#/tolerances/inputs/1/value"]);
    // What only the engine knows: the width would vanish.
    expect(found({ name: "width", rule: { mode: "open", value: "40 mm" } })).toEqual([
      "#/tolerances/inputs/0/value",
    ]);
    expect(found({ name: "width", rule: { mode: "fixed", value: "40 mm" } })).toEqual(["#/inputs"]);
  });

  test("every shape of the catalogue can become a widget of its example", () => {
    for (const shape of catalogue) {
      const request = exampleRequest(shape) as Record<string, Record<string, unknown>>;
      const inputs = [...inputsOf(shape).values()].flatMap(({ name, path }) => {
        const value = path.reduce<unknown>(
          (at, part) => (at as Record<string, unknown> | undefined)?.[part],
          request,
        );
        return value === undefined
          ? []
          : [{ name, rule: { mode: "open", value: String(value) } as InputRule }];
      });
      const found = definitionProblems(
        definition({
          shape: shape.id,
          inputs: inputs.map(({ name, rule }) =>
            name.endsWith("material")
              ? { name, rule: { ...rule, mode: "fixed" } as InputRule }
              : { name, rule },
          ),
          ...(request.medium?.graded ? { graded: request.medium.graded as never } : {}),
        }),
        libraryMaterial,
      );
      expect([shape.id, found]).toEqual([shape.id, []]);
    }
  });
});

describe("embedDefinition", () => {
  test("refuses what could break out of its place", () => {
    const bad: object[] = [
      { title: "two\nlines" },
      { accent: "red;background:url(//x)" },
      { accent: "#9C4A1" },
      { language: "xx" },
      { extra: 1 },
      { inputs: [{ name: "length<script>", rule: { mode: "fixed", value: "1" } }] },
      { inputs: [BUSBAR.inputs[0], BUSBAR.inputs[0]] },
      { tolerances: { uncertainty: { method: "propagation" }, budget: true } },
      { tolerances: { uncertainty: { method: "guess" }, budget: true, inputs: [] } },
      { tolerances: { uncertainty: { method: "monte-carlo", trials: 100_001 }, budget: true, inputs: [] } },
      {
        tolerances: {
          uncertainty: { method: "propagation" },
          budget: true,
          inputs: [
            { name: "width", rule: { mode: "fixed", value: "1 %" } },
            { name: "width", rule: { mode: "open", value: "1 %" } },
          ],
        },
      },
    ];
    for (const change of bad) expect(embedDefinition.safeParse({ ...BUSBAR, ...change }).success).toBe(false);
    expect(embedDefinition.safeParse(BUSBAR).success).toBe(true);
  });

  test("takes origins only as browsers send them", () => {
    const ok = (origin: string) =>
      embedSettings.safeParse({ name: "x", origins: [origin], monthQuota: 1 }).success;
    for (const origin of ["https://intranet.example", "http://localhost:4100", "http://[::1]:8080"])
      expect(ok(origin)).toBe(true);
    for (const origin of [
      "https://intranet.example/",
      "https://*.example",
      "*",
      "null",
      "intranet.example",
      "https://a.example; script-src *",
      "https://a.example https://b.example",
      "javascript:alert(1)",
    ])
      expect(ok(origin)).toBe(false);
  });
});

describe("widgetRequest", () => {
  test("shares nothing with the definition that a later call could change", () => {
    const before = JSON.stringify(BUSBAR);
    const request = widgetRequest(BUSBAR, { values: { length: "1 m" } });
    (request.dimensions as Record<string, unknown>).width = "1 m";
    expect(JSON.stringify(BUSBAR)).toBe(before);
    expect(widgetRequest(BUSBAR, { values: {} }).dimensions).toEqual({
      length: "250 mm",
      width: "40 mm",
      thickness: "10 mm",
    });
  });
});

describe("contrast", () => {
  // WCAG 2.2's definition: black on white is 21, equal colours are 1.
  test("follows WCAG", () => {
    expect(contrastOf("#000000", "#ffffff")).toBeCloseTo(21, 10);
    expect(contrastOf("#9c4a1f", "#9c4a1f")).toBe(1);
    expect(accentContrasts("#9c4a1f", "host").map(({ ground }) => ground)).toEqual(["light", "dark"]);
  });
});

describe("speechOf", () => {
  test("follows the team's choice, the page, then the reader", () => {
    expect(speechOf("reader", undefined, "fr-CH, en;q=0.9")).toEqual({ language: "fr", locale: "fr-CH" });
    expect(speechOf("reader", "sv", "de")).toEqual({ language: "sv", locale: "sv" });
    expect(speechOf("de", undefined, "en-GB, de-CH;q=0.5")).toEqual({ language: "de", locale: "de-CH" });
    expect(speechOf("ja", "de", null)).toEqual({ language: "ja", locale: "ja" });
    expect(speechOf("reader", "xx-<b>", "zh;q=oops, *;q=0.1")).toEqual({ language: "en", locale: "en" });
    expect(speechOf("reader", "de-x-y-z-a-b-c-d", "de-AT")).toEqual({ language: "de", locale: "de-AT" });
  });
});

describe("startDefinition", () => {
  test("of every shape can be published as it is", () => {
    for (const shape of catalogue) {
      const found = definitionProblems(startDefinition(shape), libraryMaterial);
      expect([shape.id, found]).toEqual([shape.id, []]);
    }
  });

  test("takes the values of a calculation page, and leaves what it does not know", () => {
    const bar = findShape("bar");
    if (!bar) throw new Error("The catalogue lacks the bar.");
    const values = {
      length: "1 m",
      width: "2 mm",
      thickness: "1 mm",
      resistivity: "2e-8",
      A: "x",
      shape: "bar",
    };
    const { inputs } = startDefinition(bar, values);
    expect(inputs).toEqual([
      { name: "length", rule: { mode: "open", value: "1 m" } },
      { name: "width", rule: { mode: "open", value: "2 mm" } },
      { name: "thickness", rule: { mode: "open", value: "1 mm" } },
      { name: "resistivity", rule: { mode: "fixed", value: "2e-8" } },
    ]);
  });
});

describe("readTolerance", () => {
  test("a share of the value, a length, and neither below 0", () => {
    const bar = findShape("bar");
    const width = bar && inputsOf(bar).get("width");
    if (!width) throw new Error("a bar has a width");
    const read = (text: string) => readTolerance(text, "50 mm", width);
    expect(read("2 %")).toEqual({ ok: true, size: 0.001 });
    expect(read("+2%")).toEqual({ ok: true, size: 0.001 });
    expect(read("0.4 mm")).toEqual({ ok: true, size: 0.0004 });
    for (const below of ["-2 %", "−2%", "-0.4 mm"])
      expect(read(below)).toMatchObject({ ok: false, detail: expect.stringContaining("0 or greater") });
  });
});
