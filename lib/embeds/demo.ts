import { createHmac } from "node:crypto";
import { bytesToText } from "../service/identifier";
import type { EmbedDefinition } from "./definition";

/** Id of the demo's widget: derived, so that the examples find it, and different in every installation. */
export function demoEmbedId(serviceSecret: string): string {
  const digest = createHmac("sha256", serviceSecret).update("rhoform demo embed").digest();
  return `emb_${bytesToText(digest).slice(-16)}`;
}

/** A section of busbar, within what the team builds. */
export const DEMO_EMBED: EmbedDefinition = {
  shape: "bar",
  title: "Busbar section",
  intro: "One straight section between two joints, in the sizes that we stock.",
  inputs: [
    { name: "length", rule: { mode: "open", value: "250 mm", min: "50 mm", max: "4 m" } },
    {
      name: "width",
      rule: {
        mode: "open",
        value: "40 mm",
        choices: ["20 mm", "30 mm", "40 mm", "60 mm", "80 mm", "100 mm"].map((value) => ({ value })),
      },
    },
    {
      name: "thickness",
      rule: { mode: "open", value: "10 mm", choices: [{ value: "5 mm" }, { value: "10 mm" }] },
    },
    {
      name: "material",
      rule: {
        mode: "open",
        value: "copper-annealed",
        choices: [{ value: "copper-annealed" }, { value: "aluminium-electrical" }],
      },
    },
    { name: "current", rule: { mode: "open", value: "630 A", min: "1 A", max: "4 kA" } },
    { name: "temperature", rule: { mode: "fixed", value: "65 degC" } },
  ],
  requirement: { max: "40 uohm" },
  show: { drawing: true, bounds: true, plots: false },
  theme: "host",
  density: "comfortable",
  language: "reader",
};
