import { describe, expect, it } from "vitest";
import { readPoints } from "@/app/(site)/calculate/_calculator/graded/read-points";

describe("readPoints", () => {
  it.each([
    ["comma", "0,1\n1,2"],
    ["semicolon", "0;1\n1;2"],
    ["tab", "0\t1\n1\t2"],
    ["spaces", "0   1\n1 2"],
    ["trailing blank lines", "0,1\r\n1,2\r\n\r\n"],
  ])("parts columns by %s", async (_, text) => {
    expect((await readPoints(text)).rows).toEqual([
      ["0", "1"],
      ["1", "2"],
    ]);
  });

  it("takes units from the head, or from the cells", async () => {
    const head = await readPoints("radius/mm;conductivity (MS/m)\n0,5;58\n1,5 um;57 S/m");
    expect(head.rows).toEqual([
      ["0.5 mm", "58 MS/m"],
      ["1.5 um", "57 S/m"],
    ]);
    expect(head.note).toBe("Columns taken: radius/mm and conductivity (MS/m).");
    expect((await readPoints("x [mm],σ [S/m]\n1,2")).rows).toEqual([["1 mm", "2 S/m"]]);
  });

  it("tells the line and the column of what it cannot read", async () => {
    const { rows, problems } = await readPoints("0;1\n1;x\n2\n3;4");
    expect(rows).toEqual([
      ["0", "1"],
      ["3", "4"],
    ]);
    expect(problems).toEqual([
      'Line 2, column 2: "x" is no number.',
      "Line 3 has one column; a point needs two.",
    ]);
    expect((await readPoints("")).problems).toEqual(["There is no line with two numbers."]);
  });
});
