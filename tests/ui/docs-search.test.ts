import { describe, expect, it } from "vitest";
import { plainText } from "@/app/(site)/docs/_parts/inline";
import { searchDocs } from "@/app/(site)/docs/_search/search-index";
import { TRADE_WORDS } from "@/app/(site)/docs/_search/trade-words";
import { GROUPS } from "@/app/(site)/docs/_content/pages";
import { hrefOf } from "@/app/(site)/docs/_content/page";
import { catalogue } from "@/lib/engine";

/** What people type, and the page that must be among the first three. */
const QUERIES: readonly (readonly [query: string, expected: string])[] = [
  ["busbar", "/docs/shapes/bar"],
  ["bus bar", "/docs/shapes/bar"],
  ["bent busbar", "/docs/shapes/arc-bar"],
  ["pcb track", "/docs/shapes/etched-trace"],
  ["trace", "/docs/shapes/etched-trace"],
  ["via", "/docs/shapes/via-barrel"],
  ["washer", "/docs/shapes/cylindrical-shell"],
  ["pipe", "/docs/shapes/tube"],
  ["coax insulation", "/docs/shapes/cylindrical-shell"],
  ["earth rod", "/docs/shapes/earth-rod"],
  ["ground rod", "/docs/shapes/earth-rod"],
  ["grounding grid", "/docs/shapes/earth-grid"],
  ["two-layer soil", "/docs/shapes/earth-rod-layered"],
  ["coil", "/docs/shapes/helical-winding"],
  ["litz", "/docs/shapes/stranded-conductor"],
  ["serpentine resistor", "/docs/shapes/sheet-meander"],
  ["laser trim", "/docs/shapes/sheet-slit"],
  ["four-point probe", "/docs/media#medium"],
  ["sweep", "/docs/clients#examples"],
  ["excel formula", "/docs/spreadsheets#formula"],
  ["NUMBERVALUE", "/docs/spreadsheets#formula"],
  ["npm install", "/docs/clients#typescript"],
  ["how do I get a key", "/docs/start#key"],
  ["quickstart", "/docs/start"],
  ["rate limit", "/docs/limits"],
  ["monte carlo", "/docs/uncertainty"],
  ["tolerance", "/docs/uncertainty"],
  ["iframe", "/docs/embedding#iframe"],
  ["kelvin", "/docs/quantities"],
  ["temperature coefficient", "/docs/media#medium"],
  ["finite element", "/docs/fields"],
  ["goal seek thickness", "/docs/sizing"],
  ["kirchhoff", "/docs/networks"],
  ["backup and restore", "/docs/running#backup"],
  ["nginx", "/docs/running#proxy"],
  ["doping profile", "/docs/media#graded"],
  ["wcag", "/docs/accessibility"],
  ["429", "/docs/problems/too-many-requests"],
  ["csp", "/docs/embedding#place"],
  ["pagination", "/docs/limits#sizes"],
  ["thin film sheet resistance", "/docs/shapes/sheet-strip"],
  ["invalid input", "/docs/problems/invalid-input"],
  ["taperd strip", "/docs/shapes/tapered-strip"],
  ["ln(b/a)", "/docs/shapes/cylindrical-shell"],
  ["hollow cylinder", "/docs/shapes/cylindrical-shell"],
  ["wire gauge", "/docs/shapes/round-wire"],
  ["401", "/docs/problems/missing-credentials"],
  ["503", "/docs/problems/busy"],
  ["openapi", "/docs/api"],
  ["anisotropy", "/docs/methods#not"],
  ["skin effect", "/docs/methods#not"],
  ["capacitance", "/docs/methods#not"],
  ["AC resistance", "/docs/methods#not"],
  ["forgot password", "/docs/running#people"],
  ["error bars", "/docs/bounds"],
  ["key in url", "/docs/spreadsheets#key"],
];

describe("the search of the docs", () => {
  it.each(QUERIES)("“%s” leads to %s", (query, expected) => {
    expect(
      searchDocs(query)
        .slice(0, 3)
        .map(({ href }) => href),
    ).toContain(expected);
  });

  it("finds any of the words where not all stand together, and nothing for nothing", () => {
    expect(searchDocs("busbar qqqqzzzz").map(({ href }) => href)).toContain("/docs/shapes/bar");
    expect(searchDocs("qqqqzzzz")).toEqual([]);
    expect(searchDocs("  ")).toEqual([]);
    expect(searchDocs("the of")).toEqual([]);
  });

  it("has trade words for pages that exist only", () => {
    const pages = new Set([
      ...GROUPS.flatMap(({ pages }) => pages.map(hrefOf)),
      ...catalogue.map(({ id }) => `/docs/shapes/${id}`),
      ...GROUPS.flatMap(({ pages }) =>
        pages.flatMap((page) =>
          "slug" in page ? page.sections({ origin: "" }).map(({ id }) => `${hrefOf(page)}#${id}`) : [],
        ),
      ),
    ]);
    expect(Object.keys(TRADE_WORDS).filter((href) => !pages.has(href))).toEqual([]);
  });

  it("keeps the signs of code in what it shows", () => {
    expect(plainText("a **strong** `2*pi*r^2` and [`code*`](/docs)")).toBe("a strong 2*pi*r^2 and code*");
  });
});
