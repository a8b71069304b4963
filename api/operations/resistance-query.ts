import { z } from "zod";
import { findShape, InputError, shapeEntry } from "@/lib/engine";
import { type CallContext, defineOperation, json, type Outcome } from "../operation";
import { parameterRefusal, queryObject } from "../parameters";
import { answeredResistance } from "../schemas/resistance";
import { computationsOf, compute } from "./resistance";
import { unknownShape } from "./shapes";

const MEDIUM_PARAMETERS = [
  "material",
  "resistivity",
  "conductivity",
  "sheetResistance",
  "thickness",
  "extrapolate",
];
const OPERATING_PARAMETERS = ["temperature", "voltage", "current", "power"];

const value = (description: string, example?: string) =>
  z
    .string()
    .optional()
    .meta({ description, ...(example ? { example } : {}) });

const parameters = z.looseObject({
  material: value("Id of a material of the library or the team.", "copper-annealed"),
  resistivity: value("Resistivity: a bare number in ohm metres, or with its unit.", "1.72e-8 ohm m"),
  conductivity: value("Conductivity: a bare number in S/m, or with its unit.", "58 MS/m"),
  sheetResistance: value(
    "Sheet resistance, for sheet shapes: a bare number in ohms a square, or with its unit.",
  ),
  thickness: value(
    "Thickness of the sheet, for sheet shapes, beside a material, resistivity or conductivity.",
  ),
  extrapolate: z
    .enum(["true", "false"])
    .optional()
    .meta({ description: "`true` allows a temperature outside the material's range, with a caution." }),
  temperature: value("Temperature: a bare number in °C, or with its unit.", "75"),
  voltage: value("Voltage across the terminals; at most one of voltage, current and power."),
  current: value("Current through the terminals."),
  power: value("Power turned to heat."),
  uncertainty: z
    .enum(["propagation", "worst-case", "monte-carlo"])
    .optional()
    .meta({ description: "How far the resistance strays with the tolerances, by this method." }),
  trials: value("Trials of monte-carlo, a whole number."),
  seed: value("Seed of monte-carlo, a whole number."),
  include: value("Parts to add, separated by commas: steps, profile, checks, peak.", "steps,checks"),
});

/** The body that a query stands for, and which parameter each member came from. */
interface Request {
  readonly body: Record<string, unknown>;
  readonly origins: Map<string, string>;
}

/**
 * Builds the body from the query: the shape's dimensions by name, the medium by its members (with a prefix for shapes
 * of two media), the operating point, and what to include. Every other name is taken for a dimension, so that the
 * engine tells the nearest ones.
 */
function requestOf(shape: string, query: URLSearchParams): Request {
  const definition = findShape(shape);
  if (!definition) throw unknownShape(shape);
  const entry = shapeEntry(definition);
  const types = new Map(entry.dimensions.map(({ name, type }) => [name, type]));
  const mediaNames = entry.media.names.map(({ name }) => name);
  const dimensions: Record<string, unknown> = {};
  const medium: Record<string, unknown> = {};
  const media: Record<string, Record<string, unknown>> = {};
  const operating: Record<string, unknown> = {};
  const uncertainty: Record<string, unknown> = {};
  let include: string[] | undefined;
  const origins = new Map<string, string>();
  const put = (
    target: Record<string, unknown>,
    place: string,
    name: string,
    content: unknown,
    parameter: string,
  ) => {
    target[name] = content;
    origins.set(`${place}/${name}`, parameter);
  };

  for (const [name, text] of Object.entries(queryObject(query))) {
    const [prefix, member] = name.split(".", 2);
    if (types.has(name)) {
      const whole = types.get(name) === "integer" && /^[+-]?\d+$/.test(text.trim());
      put(dimensions, "#/dimensions", name, whole ? Number(text) : toleranced(text), name);
    } else if (member !== undefined && mediaNames.includes(prefix)) {
      put((media[prefix] ??= {}), `#/media/${prefix}`, member, mediumValue(name, member, text), name);
      origins.set(`#/media/${prefix}`, name);
    } else if (MEDIUM_PARAMETERS.includes(name))
      put(medium, "#/medium", name, mediumValue(name, name, text), name);
    else if (OPERATING_PARAMETERS.includes(name)) put(operating, "#/operating", name, toleranced(text), name);
    else if (name === "uncertainty") put(uncertainty, "#/uncertainty", "method", text, name);
    else if (name === "trials" || name === "seed")
      put(uncertainty, "#/uncertainty", name, /^\d+$/.test(text.trim()) ? Number(text) : text, name);
    else if (name === "include") include = text.split(",").map((part) => part.trim());
    else put(dimensions, "#/dimensions", name, text, name);
  }
  origins.set("#/uncertainty", "uncertainty");
  origins.set("#/uncertainty/method", "uncertainty");
  origins.set("#/medium", Object.keys(medium)[0] ?? "material");
  origins.set("#/media", `${mediaNames[0] ?? "core"}.material`);
  return {
    body: {
      shape,
      dimensions,
      ...(Object.keys(medium).length > 0 ? { medium } : {}),
      ...(Object.keys(media).length > 0 ? { media } : {}),
      ...(Object.keys(operating).length > 0 ? { operating } : {}),
      ...(include ? { include } : {}),
      ...(Object.keys(uncertainty).length > 0 ? { uncertainty } : {}),
    },
    origins,
  };
}

/** `10mm±0.1mm`, `10mm±1%` or `10mm+/-0.1mm` as a quantity with its tolerance; every other text as it is. */
function toleranced(text: string): unknown {
  const sides = text.split(/±|\+\/-/);
  return sides.length === 2 ? { value: sides[0].trim(), tolerance: sides[1].trim() } : text;
}

function mediumValue(parameter: string, member: string, text: string): unknown {
  if (member !== "extrapolate") return member === "material" ? text : toleranced(text);
  if (text === "true" || text === "false") return text === "true";
  throw parameterRefusal([{ parameter, detail: "must be true or false." }]);
}

/** The parameter behind a pointer into the body; one that was not given is named as it would be. */
function parameterOf(pointer: string, origins: Map<string, string>): string {
  const known = origins.get(pointer);
  if (known) return known;
  const [place, ...path] = pointer.slice(2).split("/").map(decodeURIComponent);
  // What is wrong with a whole medium is told of the parameter that would have named its material.
  if (place === "media") return path.length === 1 ? `${path[0]}.material` : path.join(".");
  if (place === "include") return "include";
  return path[0] ?? place;
}

export const getResistance = defineOperation({
  id: "readResistance",
  method: "GET",
  path: "/resistance/{shape}",
  tag: "Resistance",
  summary: "Compute one resistance by address",
  description:
    "The same calculation for spreadsheets and links: every dimension of the shape is a parameter of its own name (`innerRadius=2mm`), a unit may follow the number. Shapes of two media take a prefix (`core.material=…&cladding.resistivity=…`). A tolerance follows its value as `width=50mm±0.4mm` (or `±1%`), and `uncertainty=` names the method. Graded media and other tolerances need the body of `POST /resistance`. As `text/plain`, or with `format=text`, the answer is the bare number in ohms, and an error is one line that begins with `error:` and keeps its status.",
  scope: "compute",
  produces: ["application/json", "text/plain"],
  request: {
    path: z.object({
      shape: z.string().max(64).meta({ description: "Id of the shape.", example: "cylindrical-shell" }),
    }),
    query: parameters,
  },
  responses: {
    200: {
      description: "The resistance.",
      content: {
        "application/json": answeredResistance,
        "text/plain": z.string().meta({ description: "The resistance in ohms, a bare number." }),
      },
    },
  },
  errors: ["not-found"],
  examples: [
    {
      name: "copperPipe",
      summary: "Between the inside and the outside of a copper pipe, at 75 °C",
      status: 200,
      path: { shape: "cylindrical-shell" },
      query: {
        innerRadius: "2mm",
        outerRadius: "5mm",
        length: "1m",
        material: "copper-annealed",
        temperature: "75",
      },
    },
    {
      name: "tolerance",
      summary: "With a tolerance",
      status: 200,
      path: { shape: "bar" },
      query: {
        length: "1m",
        width: "50mm±0.4mm",
        thickness: "10mm±1%",
        material: "copper-annealed",
        uncertainty: "propagation",
      },
    },
    {
      name: "bareNumber",
      summary: "A bare number for a spreadsheet",
      status: 200,
      path: { shape: "bar" },
      query: { length: "1m", width: "50mm", thickness: "10mm", material: "copper-annealed", format: "text" },
      accept: "text/plain",
    },
    {
      name: "textError",
      summary: "An error in text form",
      status: 422,
      path: { shape: "bar" },
      query: { length: "1m", width: "50mm", thickness: "10kg", material: "copper-annealed", format: "text" },
      accept: "text/plain",
    },
    {
      name: "missingDimension",
      summary: "A dimension is missing",
      status: 422,
      path: { shape: "cylindrical-shell" },
      query: { innerRadius: "2mm", outerRadius: "5mm", material: "copper-annealed" },
    },
  ],
  reserve: ({ query }) =>
    computationsOf({ uncertainty: { method: query.uncertainty, trials: Number(query.trials) } }),
  handler: ({ path, rawQuery }, context) => {
    const { body, origins } = requestOf(path.shape, rawQuery);
    try {
      return answer(body, context);
    } catch (error) {
      if (!(error instanceof InputError)) throw error;
      throw parameterRefusal(
        error.errors.map(({ pointer, detail }) => ({ parameter: parameterOf(pointer, origins), detail })),
      );
    }
  },
});

function answer(body: unknown, context: CallContext): Outcome {
  const result = compute(body, context);
  const facts = { shape: result.shape, computations: computationsOf(body) };
  if (context.accepts !== "text/plain") return json(200, result, facts);
  return {
    status: 200,
    content: { kind: "text", text: String(result.resistance.value), mediaType: "text/plain" },
    ...facts,
  };
}
