import { existsSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { AGAINST, comparisonsOf, ROWS, titleOf } from "@/app/(site)/docs/accuracy/compared";
import { BASES } from "@/app/(site)/docs/_content/bounds";
import { catalogue } from "@/lib/engine";

describe("the accuracy part of a shape's page", () => {
  it("says of every file of the table what its tests compare with, and names shapes that exist", () => {
    const known = new Set(catalogue.map(({ id }) => id));
    for (const { file, cases, worst, shapes } of ROWS) {
      expect(
        AGAINST.some(([prefix]) => file.startsWith(prefix)),
        file,
      ).toBe(true);
      expect(existsSync(file), file).toBe(true);
      for (const [id, own] of Object.entries(shapes)) {
        expect(known.has(id), id).toBe(true);
        expect(own?.cases).toBeLessThanOrEqual(cases);
        expect(own?.worst).toBeLessThanOrEqual(worst);
      }
    }
  });

  it("tells the comparisons of that very shape", () => {
    expect(comparisonsOf("clad-wire").map(({ group }) => group)).toContain("Reference values with 50 digits");
    expect(comparisonsOf("round-wire")).toContainEqual(
      expect.objectContaining({
        group: expect.stringContaining("CRC Handbook wire tables"),
        against: expect.stringContaining("printed tables"),
      }),
    );
    expect(comparisonsOf("earth-rod").some(({ group }) => group.includes("clad-wire"))).toBe(false);
    expect(comparisonsOf("no-such-shape")).toEqual([]);
  });

  it("calls the groups by words, not by names of the code", () => {
    for (const { group } of ROWS) expect(titleOf(group)).not.toMatch(/\(seen\)|^[a-z]|^\w+-\w+$|[a-z][A-Z]/);
    expect(titleOf("torus-arc")).toBe("Bent round bar");
  });

  it("has a sentence for every basis that a shape may have", () => {
    const told = BASES.map(([basis]) => basis);
    for (const { boundsBasis } of catalogue) expect(told).toContain(boundsBasis);
  });
});
