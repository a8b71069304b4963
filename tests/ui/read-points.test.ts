import { describe, expect, it } from "vitest";
import { readPoints, readPointsFile } from "@/app/(site)/calculate/_calculator/graded/read-points";

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

  it.each([
    ["mm,S/m", "1 mm", "2 S/m"],
    ["m;ohm m", "1 m", "2 ohm m"],
    ["position mm;conductivity MS/m", "1 mm", "2 MS/m"],
    ["depth/µm;N/(1/cm^3)", "1 µm", "2 1/cm^3"],
    ["x;y", "1", "2"],
  ])("takes %s for the units of a head", async (head, place, value) => {
    const { rows } = await readPoints(`${head}\n${head.includes(";") ? "1;2" : "1,2"}`);
    expect(rows).toEqual([[place, value]]);
  });

  it("refuses more than a request can carry", async () => {
    const line = (k: number) => `0.${String(k).padStart(12, "0")};57999950.123456`;
    const text = Array.from({ length: 40_000 }, (_, k) => line(k)).join("\n");
    const { rows, problems } = await readPoints(`m;S/m\n${text}`);
    expect(rows).toEqual([]);
    expect(problems).toEqual([
      "40000 points with so many digits are longer than a request may be; about 23000 of them fit.",
    ]);
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

describe("readPointsFile", () => {
  const given = (name: string, bytes: BlobPart) => readPointsFile(new File([bytes], name));

  it("takes nothing of a file with a line that is no point", async () => {
    expect(await given("torn.csv", "mm;pS/m\n2;1\n3;x\n4\n5;2")).toEqual({
      rows: [],
      problems: ['Line 3, column 2: "x" is no number.', "Line 4 has one column; a point needs two."],
      note: "Nothing of “torn.csv” was taken.",
    });
    expect((await given("empty.csv", "")).problems).toEqual(["There is no line with two numbers."]);
    expect((await given("picture.csv", Buffer.from([0x89, 0x50, 0x4e, 0x47]))).problems[0]).toContain(
      "a PNG",
    );
  });

  it("reads a file that is not in UTF-8, and says so", async () => {
    const { rows, note } = await given("western.csv", Buffer.from("Länge/µm;pS/m\n2000;1\n5000;2", "latin1"));
    expect(rows).toEqual([
      ["2000 µm", "1 pS/m"],
      ["5000 µm", "2 pS/m"],
    ]);
    expect(note).toMatch(/^Columns taken: Länge\/µm and pS\/m\. “western\.csv” is not in UTF-8\./);
  });
});
