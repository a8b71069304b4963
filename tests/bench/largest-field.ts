/** Solves the plate with 100 holes until it meets the cap on unknowns; prints what that took, as JSON. */
import { prepareField, solveField } from "@/lib/engine";
import { MOST_UNKNOWNS } from "@/lib/jobs/field-cost";
import { sieve } from "./field-outlines";

const { problem } = prepareField(
  { ...sieve(), accuracy: 1e-8 },
  { material: () => undefined, outline: () => undefined },
);
const { unknowns, status } = solveField(problem, { accuracy: 1e-10, maximumUnknowns: MOST_UNKNOWNS });
const { maxRSS } = process.resourceUsage();
process.stdout.write(JSON.stringify({ unknowns, status, megabytes: maxRSS / 1024 }));
