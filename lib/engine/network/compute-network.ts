/** A network request to the resistance between its ports, with bounds, node voltages and element currents. */
import { CheckFailure, InputError, Problems } from "../failure";
import { formatQuantity } from "../quantity/format-quantity";
import { between, isRepresentable } from "../resistance/bounds";
import type { ComputeContext } from "../resistance/compute-context";
import { operatingPoint, readOperating } from "../resistance/operating-point";
import { readRequirement, verdictOf } from "../resistance/requirement";
import { addSchemaComplaints } from "../schema-complaints";
import { CATALOGUE_VERSION, ENGINE_VERSION } from "../version";
import { carryingElements, incidenceOf, reachedFrom, type Incidence } from "./branches";
import { checkFlow, flowOf, spreadPotential } from "./flow";
import { CORNERS, findNetworkUncertainty } from "./network-uncertainty";
import {
  MOST_COMPLAINTS,
  nameNodes,
  type NamedNodes,
  type NetworkElement,
  readElements,
} from "./read-elements";
import { type NetworkRequest, networkRequestSchema } from "./request-schema";
import type { NetworkResult } from "./result-schema";
import { collectStatements } from "./statements";
import { solveCarrying } from "./solve-carrying";

/**
 * Computes a network.
 * @param request the body of `POST /networks` as it arrived; it is validated here.
 * @throws InputError for everything that the caller can get wrong; CheckFailure where a check of the engine fails.
 */
export function computeNetwork(request: unknown, context: ComputeContext): NetworkResult {
  const work = networkInStretches(request, context);
  for (;;) {
    const { done, value } = work.next();
    if (done) return value;
  }
}

/** The same in stretches of a few hundredths of a second: between them other work may have its turn. */
export function* networkInStretches(
  request: unknown,
  context: ComputeContext,
): Generator<void, NetworkResult> {
  const problems = new Problems();
  const parsed = networkRequestSchema.safeParse(request, { reportInput: true });
  if (!parsed.success) {
    addSchemaComplaints(networkRequestSchema, parsed.error.issues.slice(0, MOST_COMPLAINTS), "#", problems);
    throw new InputError(problems.list);
  }
  const body = parsed.data;
  const operatingInput = readOperating(body.operating, problems);
  const requirement = readRequirement(body.requirement, problems);
  const nodes = nameNodes(body, problems);
  const read = yield* readElements(body, context, problems);
  const elements = read.filter((element) => element !== null);
  if (problems.any || !nodes || elements.length < read.length) throw new InputError(limited(problems));

  const incidence = incidenceOf({ nodes: nodes.names.length, ...nodes });
  requireJoined(body, nodes, incidence, problems);
  problems.throwIfAny();
  const carrying = carryingElements(
    { nodes: nodes.names.length, ...nodes },
    incidence,
    nodes.high,
    nodes.low,
  );
  const asked = body.uncertainty?.method;
  const { solution, active, corners } = yield* solveCarrying(
    nodes,
    elements,
    carrying,
    asked ? CORNERS : [],
    problems,
  );

  const rounded = elements.every(({ result }) => !result || result.resistance.boundsBasis === "rounding");
  const [value, highest = value, lowest = value] = solution.conductance.map((conductance) => 1 / conductance);
  const bounds = between(value, lowest, highest, solution.error);
  const proved = elements.every(({ result }) => result?.resistance.proved ?? true);
  if (![bounds.value, bounds.lower, bounds.upper].every(isRepresentable)) {
    problems.add("#", "The resistance must lie between 1e-300 and 1e300 ohm.");
  }
  const operating = operatingPoint(operatingInput, value, problems);
  problems.throwIfAny();

  const potential = spreadPotential(nodes, incidence, active, solution);
  const flow = flowOf(nodes, elements, active, solution);
  const checks = checkFlow(nodes, flow, potential);
  for (const { name, passed, deviation, tolerance } of checks) {
    if (!passed) throw new CheckFailure(name, deviation, tolerance);
  }
  const voltage = operating.voltage ?? 1;
  const current = operating.current ?? 1 / value;
  const power = operating.power ?? voltage * current;
  const result: NetworkResult = {
    resistance: {
      value,
      unit: "ohm",
      text: formatQuantity(value, "ohm", bounds),
      lower: bounds.lower,
      upper: bounds.upper,
      boundsBasis: rounded ? "rounding" : "elements",
      proved,
    },
    conductance: {
      value: 1 / value,
      unit: "siemens",
      text: formatQuantity(1 / value, "siemens", { lower: 1 / bounds.upper, upper: 1 / bounds.lower }),
    },
    operating,
    per: operating.voltage === undefined ? "volt" : "operating-point",
    nodes: nodes.names.map((name, n) => ({ name, voltage: potential[n] * voltage })),
    elements: body.elements.map(({ name, between: ends }, e) => ({
      name,
      between: ends,
      resistance: elements[e].ohm,
      ...boundsOf(elements[e]),
      current: flow.current[e] * current,
      voltage: flow.difference[e] * voltage,
      power: flow.share[e] * power,
      share: flow.share[e],
      sensitivity: flow.current[e] ** 2,
    })),
    checks,
    ...collectStatements(body, elements, carrying, asked !== undefined),
    engine: ENGINE_VERSION,
    catalogue: CATALOGUE_VERSION,
  };
  if (asked) {
    const names = body.elements.map(({ name }) => name);
    const sensitivity = flow.current.map((part) => part ** 2);
    const found = findNetworkUncertainty(asked, { names, elements, sensitivity, value, corners });
    result.uncertainty = found.uncertainty;
    result.cautions.push(...found.cautions);
  }
  if (requirement) result.verdict = verdictOf(requirement, bounds, result.uncertainty);
  return result;
}

function boundsOf({ result }: NetworkElement): Pick<NetworkResult["elements"][number], "bounds"> {
  if (!result) return {};
  const { lower, upper, boundsBasis, proved } = result.resistance;
  return { bounds: { lower, upper, boundsBasis, proved } };
}

/** Every element and both ports must hang together: a part without a port has no potential. */
function requireJoined(
  { elements, ports }: NetworkRequest,
  nodes: NamedNodes,
  incidence: Incidence,
  problems: Problems,
): void {
  const graph = { nodes: nodes.names.length, from: nodes.from, to: nodes.to };
  const reached = reachedFrom(graph, incidence, nodes.high);
  if (!reached[nodes.low]) {
    problems.add("#/ports", `No chain of elements joins "${ports[0]}" and "${ports[1]}".`);
    return;
  }
  for (let e = 0; e < elements.length; e++) {
    if (reached[nodes.from[e]]) continue;
    // One complaint an island, at its first element.
    const island = reachedFrom(graph, incidence, nodes.from[e]);
    const names = nodes.names.filter((_, n) => island[n]);
    const shown = names.slice(0, 5).map((name) => `"${name}"`);
    const more = names.length > 5 ? ` and ${names.length - 5} more` : "";
    problems.add(
      `#/elements/${e}/between`,
      `belongs to an island: no element joins ${shown.join(", ")}${more} to the ports.`,
    );
    for (let n = 0; n < island.length; n++) reached[n] |= island[n];
    if (problems.list.length >= MOST_COMPLAINTS) return;
  }
}

function limited({ list }: Problems): Problems["list"] {
  if (list.length <= MOST_COMPLAINTS) return list;
  const rest = list.length - MOST_COMPLAINTS;
  return [
    ...list.slice(0, MOST_COMPLAINTS),
    { pointer: "#/elements", detail: `and ${rest} more complaints.` },
  ];
}
