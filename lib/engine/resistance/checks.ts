/**
 * The engine's checks on each answer. A resistance may depend on geometry and conductivity only: the assumed voltage
 * must cancel, the same current must cross every section, and a second route must lead to the same number.
 */
import { CheckFailure } from "../failure";
import { integrate } from "../numeric/gauss-kronrod";
import { gaussLegendre } from "../numeric/gauss-legendre";
import type { AcrossConductor } from "./across-conductor";
import { AlongConductor, uniformLaw } from "./along-conductor";
import type { Check } from "./result-schema";
import type { AlongView, FactorView, MediaView, Solution } from "./solution";

const VOLTAGE_TOLERANCE = 1e-12;
const CONTINUITY_TOLERANCE = 1e-8;
const ROUTE_TOLERANCE = 1e-9;
/** Estimated relative error beyond which an integral says nothing about a closed form. */
const WORST_DOUBT = 1e-6;
/** The two assumed voltages; any two would do. */
const VOLTAGES = [1, 1234.5] as const;
/** Parts of the range at which currents are compared; odd ones, so that they seldom meet a border. */
const PLACES = [0.0731, 0.2847, 0.5109, 0.7313, 0.9271] as const;
/** Half the distance over which the potential is differenced, as a part of the piece it lies in. */
const STEP = 1e-4;

const FACTOR_REASON =
  "The resistance of this shape is known as a whole; there is no law of the field inside to integrate.";

/** Runs every check. @throws CheckFailure on the first one that fails. */
export function runChecks(solution: Solution): Check[] {
  const checks = listChecks(solution);
  for (const check of checks) {
    if (check.passed === false)
      throw new CheckFailure(check.name, check.deviation ?? NaN, check.tolerance ?? NaN);
  }
  return checks;
}

/** Every check with its outcome, none of them thrown. */
export function listChecks(solution: Solution): Check[] {
  const { view } = solution;
  switch (view.kind) {
    case "along": {
      const currents = sectionCurrents(view.conductor(), view.integralOhm);
      return [voltageCheck(currents), continuityCheck(currents), alongRoute(solution, view)];
    }
    case "across": {
      const { along } = view.tubes;
      const unit = new AlongConductor(along, uniformLaw(1, along.extent));
      const currents = sectionCurrents(unit, unit.total().value);
      return [voltageCheck(currents), continuityCheck(currents), integralRoute(solution, view.conductor)];
    }
    case "factor":
      return [
        { name: "voltage-independence", applies: false, reason: FACTOR_REASON },
        { name: "current-continuity", applies: false, reason: FACTOR_REASON },
        factorRoute(solution, view),
      ];
    case "media":
      return mediaChecks(solution, view);
  }
}

/** Current through each place at each voltage, by the field there; `total` is what V/R makes it. */
interface SectionCurrents {
  /** [voltage][place] over the current V/R expected. */
  readonly ratios: readonly (readonly number[])[];
}

/**
 * At each place the potential is differenced over a small distance to the field, the field gives the current density,
 * and that the current through the section. Places where the field jumps are left out.
 */
function sectionCurrents(conductor: AlongConductor, totalOhm: number): SectionCurrents {
  const { flow, law } = conductor;
  const slopes: number[] = [];
  const sections: number[] = [];
  for (const part of PLACES) {
    const piece = law.count === 1 ? 0 : Math.floor(part * law.count);
    const width = law.width[piece];
    const x = law.from[piece] + (law.count === 1 ? part : 0.5) * width;
    const step = STEP * width;
    const near = differenced(conductor, x, step / 2);
    const far = differenced(conductor, x, step);
    if (!(Math.abs(near / far - 1) <= 1e-6)) continue;
    // Richardson: the two differences together are exact to the fourth order of the step.
    slopes.push((4 * near - far) / 3 / totalOhm);
    sections.push(flow.section(x) / conductor.resistivityAt(x));
  }
  return {
    ratios: VOLTAGES.map((voltage) =>
      slopes.map((slope, i) => {
        const fieldAlong = voltage * slope;
        const current = fieldAlong * sections[i];
        return current / (voltage / totalOhm);
      }),
    ),
  };
}

/** Mean of dR/dx over x ∓ step, three Gauss points. */
function differenced(conductor: AlongConductor, x: number, step: number): number {
  const { nodes, weights } = gaussLegendre(3);
  let sum = 0;
  for (let i = 0; i < 3; i++) sum += weights[i] * conductor.densityAt(x + step * (2 * nodes[i] - 1));
  return sum;
}

function voltageCheck({ ratios }: SectionCurrents): Check {
  const [first, second] = ratios;
  const deviation = first.reduce((worst, ratio, i) => Math.max(worst, Math.abs(second[i] / ratio - 1)), 0);
  return outcome("voltage-independence", deviation, VOLTAGE_TOLERANCE);
}

function continuityCheck({ ratios }: SectionCurrents): Check {
  const deviation = ratios[0].reduce((worst, ratio) => Math.max(worst, Math.abs(ratio - 1)), 0);
  return outcome("current-continuity", deviation, CONTINUITY_TOLERANCE);
}

/** The closed form against ∫ρ dx/section and against each family of parallel tubes; an integral against its twin. */
function alongRoute(solution: Solution, view: AlongView): Check {
  if (view.medium.kind === "graded") {
    return integralRoute(solution, view.conductor());
  }
  const resistivity = view.medium.value;
  const series = view.conductor().total({ relative: 1e-11, evaluations: 5000 });
  let deviation = Math.abs(series.value / view.integralOhm - 1);
  let doubt = series.error / series.value;
  for (const { tube, extent } of view.tubes().across) {
    const tubes = integrate(tube, 0, extent, { relative: 1e-11, evaluations: 5000 });
    deviation = Math.max(deviation, Math.abs((tubes.value / resistivity) * view.integralOhm - 1));
    doubt = Math.max(doubt, tubes.error / tubes.value);
  }
  // A section that falls by many decades within the last digit of the coordinate cannot be integrated in doubles.
  if (!(doubt <= WORST_DOUBT)) {
    const reason = "These proportions are too extreme for the integral along the flow to be resolved.";
    return { name: "second-route", applies: false, reason };
  }
  return outcome("second-route", deviation, Math.max(ROUTE_TOLERANCE, 3 * doubt));
}

/** An integral against the same one with other nodes. */
function integralRoute(solution: Solution, conductor: AlongConductor | AcrossConductor): Check {
  const first = solution.integral;
  if (!first) return { name: "second-route", applies: false, reason: "There is no integral to compare." };
  const second = solution.secondIntegral ?? conductor.secondTotal(first);
  const deviation = Math.abs(second.value / first.value - 1);
  const doubt = (first.error + second.error) / first.value;
  // Where both estimates are poor the answer says so itself, by its bounds and a caution.
  return outcome("second-route", deviation, Math.max(ROUTE_TOLERANCE, 3 * doubt));
}

function factorRoute(solution: Solution, view: FactorView): Check {
  const second = view.answer.secondRoute?.(solution.dimensions) ?? null;
  if (!second) {
    return {
      name: "second-route",
      applies: false,
      reason: "No second route of like accuracy reaches these dimensions.",
    };
  }
  return outcome("second-route", Math.abs(second.value / view.law.value - 1), second.tolerance);
}

function mediaChecks(solution: Solution, view: MediaView): Check[] {
  const { parallel, resistivities, answer } = view;
  const second = resistivities && (answer.secondRoute?.(solution.dimensions, resistivities) ?? null);
  const route: Check = second
    ? outcome("second-route", Math.abs(second.value / solution.value - 1), second.tolerance)
    : {
        name: "second-route",
        applies: false,
        reason: "No second route of like accuracy reaches these dimensions.",
      };
  if (!parallel || !resistivities) {
    return [
      { name: "voltage-independence", applies: false, reason: FACTOR_REASON },
      { name: "current-continuity", applies: false, reason: FACTOR_REASON },
      route,
    ];
  }
  const { along, shares } = parallel;
  const unit = new AlongConductor(along, uniformLaw(1, along.extent));
  const currents = sectionCurrents(unit, unit.total().value);
  const conductance = Object.entries(shares).reduce(
    (sum, [name, share]) => sum + 1 / (share * resistivities[name]),
    0,
  );
  const parallelRoute = outcome("second-route", Math.abs(conductance * solution.value - 1), ROUTE_TOLERANCE);
  return [voltageCheck(currents), continuityCheck(currents), second ? route : parallelRoute];
}

function outcome(name: Check["name"], deviation: number, tolerance: number): Check {
  return { name, applies: true, passed: deviation <= tolerance, deviation, tolerance };
}
