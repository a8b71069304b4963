/**
 * Computes a list of bars from a CSV file with the columns label, length/mm, width/mm and thickness/mm:
 * `parts-list.ts parts.csv`. Prints the answered table; the exit code is 1 if a row was refused.
 */
import { readFileSync } from "node:fs";
import { computeAll, rhoform, type ResistanceRequest } from "@rhoform/client";

const [file] = process.argv.slice(2);
if (file === undefined) throw new Error("Name a CSV file.");
const client = rhoform({
  baseUrl: process.env.RHOFORM_URL ?? "http://127.0.0.1:3000",
  key: process.env.RHOFORM_KEY,
});

const [header, ...rows] = readFileSync(file, "utf8")
  .trim()
  .split(/\r?\n/)
  .map((line) => line.split(","));
const cell = (row: readonly string[], name: string) => row[header.indexOf(name)] ?? "";
const requests = rows.map((row): ResistanceRequest => ({
  shape: "bar",
  dimensions: {
    length: `${cell(row, "length/mm")} mm`,
    width: `${cell(row, "width/mm")} mm`,
    thickness: `${cell(row, "thickness/mm")} mm`,
  },
  medium: { material: "copper-annealed" },
  include: [],
}));

console.log("label,resistance/ohm,lower/ohm,upper/ohm,problem");
for (const item of await computeAll({ client, requests })) {
  const label = cell(rows[item.index], "label");
  if ("problem" in item) {
    const detail = item.problem.errors?.[0]?.detail ?? item.problem.detail;
    console.log(`${label},,,,"${detail.replaceAll('"', '""')}"`);
    process.exitCode = 1;
  } else {
    const { value, lower, upper } = item.result.resistance;
    console.log([label, value, lower, upper, ""].join(","));
  }
}
