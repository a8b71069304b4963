/** What the page says about methods, bounds, checks and verdicts. */
import type { ResistanceResult } from "@/lib/engine/resistance/result-schema";

export const METHODS: Readonly<Record<ResistanceResult["method"], string>> = {
  "closed-form": "Closed form",
  quadrature: "Numerical integral",
  field: "Field solution",
};

export const BOUNDS_MEANING: Readonly<Record<ResistanceResult["resistance"]["boundsBasis"], string>> = {
  rounding:
    "The bounds hold the rounding of the computation; the law itself is exact for the stated problem.",
  quadrature: "The bounds are the estimated error of the numerical integral.",
  rayleigh:
    "The true value lies between: perfectly conducting sheets laid across the flow give the lower bound, insulating walls along it the upper one.",
  "formula-accuracy": "The bounds are the accuracy that the formula is stated to have.",
  energy: "The true value lies between two field solutions, of the potential and of its stream function.",
  "energy-quadrature":
    "The bounds come from two field solutions whose integrals over the varying conductivity are estimated.",
};

export const CHECK_TITLES: Readonly<Record<string, string>> = {
  "voltage-independence": "The assumed voltage drops out",
  "current-continuity": "The same current crosses every section",
  "second-route": "Two routes agree",
  "current-law": "Currents at each node add up to nothing",
  "voltage-law": "Voltages along each loop add up to nothing",
  "power-balance": "The elements turn to heat what the ports take in",
};

export const VERDICTS = {
  met: { word: "met", sentence: "The requirement is met, bounds and evaluated tolerances included." },
  "not-met": {
    word: "not met",
    sentence: "The requirement is not met, bounds and evaluated tolerances included.",
  },
  undecided: {
    word: "undecided",
    sentence: "Bounds or tolerances reach across a limit, so the requirement is undecided.",
  },
} as const;

export const PROVENANCE: Readonly<Record<string, string>> = {
  "source at hand": "from the source",
  "from memory": "recalled, checked by a second route",
  "derived here": "derived here",
  measured: "measured",
};
