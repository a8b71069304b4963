import { describe, expect, test } from "vitest";
import {
  catalogue,
  computeResistance,
  exampleRequest,
  libraryMaterials,
  readableDrawing,
  resolveDimensions,
} from "@/lib/engine";
import { inputsOf } from "@/lib/embeds/inputs";
import { LANGUAGES } from "@/lib/embeds/language";
import { cautionIn } from "@/app/embed/_cautions/caution-in";
import { cautionTexts } from "@/app/embed/_cautions/choose";
import { de as germanCautions } from "@/app/embed/_cautions/de";
import { es as spanishCautions } from "@/app/embed/_cautions/es";
import { fr as frenchCautions } from "@/app/embed/_cautions/fr";
import { ja as japaneseCautions } from "@/app/embed/_cautions/ja";
import { sv as swedishCautions } from "@/app/embed/_cautions/sv";
import { labelIn } from "@/app/embed/_labels/label-in";
import { wordsOf } from "@/app/embed/_words/choose";

const OTHERS = LANGUAGES.filter((language) => language !== "en");

/** Every text of a language by its path: "basis.rounding". */
function texts(value: object, path = ""): Map<string, string> {
  const found = new Map<string, string>();
  for (const [name, part] of Object.entries(value)) {
    const key = path === "" ? name : `${path}.${name}`;
    if (typeof part === "string") found.set(key, part);
    else for (const [inner, text] of texts(Object(part), key)) found.set(inner, text);
  }
  return found;
}

const places = (text: string) => [...text.matchAll(/\{\d\}/g)].map(([place]) => place).sort();

describe("a frame's own words", () => {
  const english = texts(wordsOf("en"));

  test.each(OTHERS)(
    "are all there in %s, none left in English, with the same places to fill in",
    (language) => {
      const own = texts(wordsOf(language));
      expect([...own.keys()].sort()).toEqual([...english.keys()].sort());
      // These are spelt alike in both languages.
      const alike: Readonly<Record<string, readonly string[]>> = {
        de: ["potential"],
        fr: ["conductance"],
        sv: ["potential"],
      };
      const same = [...own].filter(([key, text]) => text === english.get(key)).map(([key]) => key);
      expect(same).toEqual(alike[language] ?? []);
      for (const [key, text] of own) {
        expect([key, places(text)]).toEqual([key, places(english.get(key) ?? "")]);
        expect([key, text.trim()]).toEqual([key, text]);
      }
    },
  );
});

describe("the catalogue's labels", () => {
  const labels = new Set<string>();
  for (const shape of catalogue) {
    for (const { label, choices } of inputsOf(shape).values()) {
      labels.add(label);
      for (const choice of choices) labels.add(choice.label);
    }
    for (const { role, label } of shape.coordinates) if (role === "along") labels.add(label);
    const { dimensions }: { dimensions?: Record<string, unknown> } = Object(exampleRequest(shape));
    const { drawing } = readableDrawing(shape, resolveDimensions(shape, dimensions ?? {}));
    for (const { title } of drawing.views) labels.add(title);
  }
  /** Words that the other language shares with English. */
  const SHARED: Readonly<Record<string, readonly string[]>> = {
    de: ["Radius", "Material", "Position", "ring"],
    fr: ["Angle", "Position"],
    es: ["Material"],
    sv: ["Diameter", "Area", "Material", "Position", "ring"],
    ja: [],
  };

  test.each(OTHERS)("are all there in %s", (language) => {
    const missing = [...labels].filter(
      (label) => labelIn(language, label) === label && !SHARED[language].includes(label),
    );
    expect(missing).toEqual([]);
  });

  test("are the trade's own", () => {
    const sheet = OTHERS.map((language) => labelIn(language, "Sheet resistance"));
    expect(sheet).toEqual([
      "Flächenwiderstand",
      "Résistance par carré",
      "Resistencia de lámina",
      "Ytresistans",
      "シート抵抗",
    ]);
    const resistivity = OTHERS.map((language) => labelIn(language, "Resistivity"));
    expect(resistivity).toEqual([
      "Spezifischer Widerstand",
      "Résistivité",
      "Resistividad",
      "Resistivitet",
      "抵抗率",
    ]);
    expect(labelIn("de", "Resistivity, upper layer")).toBe("Spezifischer Widerstand, obere Schicht");
    expect(labelIn("en", "Resistivity, core")).toBe("Resistivity, core");
    expect(labelIn("fr", "Something of a team")).toBe("Something of a team");
    expect(labelIn("fr", "constructor")).toBe("constructor");
  });
});

describe("cautions", () => {
  /** Everything that the catalogue can show: of its shapes, of its examples' answers, and of its materials. */
  const shown = new Map<string, readonly string[]>();
  for (const shape of catalogue) {
    const { cautions } = computeResistance(exampleRequest(shape), {
      material: (id) => libraryMaterials.find((material) => material.id === id),
    });
    shown.set(shape.id, [...shape.cautions, ...cautions]);
  }
  const bar = (material: string, temperature = 20) =>
    computeResistance(
      {
        shape: "bar",
        dimensions: { length: "1 m", width: "10 mm", thickness: "1 mm" },
        medium: { material, extrapolate: true },
        operating: { temperature },
        uncertainty: { method: "worst-case" },
      },
      { material: (id) => libraryMaterials.find((known) => known.id === id) },
    ).cautions;
  for (const { id, range } of libraryMaterials) {
    shown.set(id, [...bar(id, (range.from + range.to) / 2), ...bar(id, range.to + 1)]);
  }

  test.each(OTHERS)("are told in %s, with the same numbers", (language) => {
    const left: string[] = [];
    for (const [id, cautions] of shown) {
      const own = catalogue.find((shape) => shape.id === id)?.cautions ?? [];
      const translated = cautionTexts(language, own);
      for (const caution of cautions) {
        const { text, english } = cautionIn(translated, caution);
        if (english || text === caution) left.push(caution);
        // Nothing that the answer filled in is lost.
        for (const number of caution.match(/\d+(?:\.\d+)?/g) ?? []) {
          const found = text.includes(number) || text.includes(number.replace(".", ","));
          if (!found) left.push(`${number}: ${text}`);
        }
        expect(text).not.toMatch(/\{\d\}/);
      }
    }
    expect([...new Set(left)]).toEqual([]);
  });

  test("keep the deference to the local code and a competent engineer", () => {
    const deference = {
      de: [germanCautions, /kein Konformitätsnachweis.*örtlich geltenden Vorschriften.*befähigten Fachkraft/],
      fr: [frenchCautions, /non d’une preuve de conformité.*réglementation locale.*ingénieur/],
      es: [spanishCautions, /no acredita conformidad.*normativa local.*ingeniero/],
      sv: [swedishCautions, /inget bevis på överensstämmelse.*lokala föreskrifter.*kompetent ingenjör/],
      ja: [japaneseCautions, /適合の証明ではありません.*現地の規定.*技術者/],
    } as const;
    for (const [language, [all, pattern]] of Object.entries(deference)) {
      const safety = Object.entries(all).filter(([english]) => english.includes("no proof of compliance"));
      expect([language, safety.length]).toEqual([language, 4]);
      for (const [, text] of safety) expect(text).toMatch(pattern);
    }
  });

  test.each(OTHERS)("have the same places to fill in, in %s", (language) => {
    for (const [english, text] of Object.entries(cautionTexts(language, []))) {
      expect([english, places(text)]).toEqual([english, places(english)]);
    }
  });

  test("of shapes of another kind do not travel to the frame", () => {
    const texts = Object.keys(cautionTexts("de", []));
    expect(texts.filter((text) => catalogue.some(({ cautions }) => cautions.includes(text)))).toEqual([]);
    expect(cautionTexts("en", catalogue[0].cautions)).toEqual({});
  });
});
