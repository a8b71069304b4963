/** Sweeps one dimension of a shape and prints a table. Reads RHOFORM_URL and RHOFORM_KEY. */
import { computeAll, rhoform, type ResistanceRequest } from "@rhoform/client";

const client = rhoform({
  baseUrl: process.env.RHOFORM_URL ?? "http://127.0.0.1:3000",
  key: process.env.RHOFORM_KEY,
});

const widthsM = Array.from({ length: 17 }, (_, step) => 0.01 + 0.005 * step);
const requests = widthsM.map((width): ResistanceRequest => ({
  shape: "bar",
  dimensions: { length: "1.2 m", width, thickness: "10 mm" },
  medium: { material: "copper-annealed" },
  operating: { temperature: "65 degC" },
  include: [],
}));

console.log("width/mm,resistance/ohm,lower/ohm,upper/ohm");
for (const item of await computeAll({ client, requests })) {
  if ("problem" in item) throw new Error(item.problem.detail);
  const { value, lower, upper } = item.result.resistance;
  console.log([(1000 * widthsM[item.index]).toPrecision(6), value, lower, upper].join(","));
}
