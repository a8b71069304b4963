/** Shapes that are exact by flow tubes: uniform, graded along the flow, graded across it. */
import { InputError, pointerTo } from "../failure";
import type { GradedMedium, ResolvedMedium, UniformMedium } from "../medium/resolve-medium";
import type { Integral } from "../numeric/gauss-kronrod";
import { siText } from "../quantity/format-quantity";
import type { Dimensions, FlowAnswer, FlowTubes, Resolved } from "../shape/define-shape";
import { AcrossConductor } from "./across-conductor";
import { AlongConductor, uniformLaw } from "./along-conductor";
import { around, between, CLOSED_FORM_ERROR, QUADRATURE_FLOOR, type Bounds } from "./bounds";
import { PROMISED_ACCURACY, UnfitValue } from "./law-integral";
import type { AlongView, Solution } from "./solution";

/** An integral whose estimate is worse than this is refused rather than shown with wide bounds. */
const WORST_RELATIVE_ERROR = 1e-3;
const NONE: readonly string[] = [];

/** Solves a flow shape. @throws InputError where the medium's law cannot be integrated. */
export function solveFlow(
  answer: FlowAnswer<Dimensions>,
  dimensions: Resolved<Dimensions>,
  medium: ResolvedMedium,
): Solution {
  if (medium.kind === "uniform") return solveUniform(answer, dimensions, medium);
  const tubes = answer.flow(dimensions);
  const integrated = medium.coordinate.role === "along" ? solveAlong : solveAcross;
  try {
    return integrated(answer, dimensions, medium, tubes);
  } catch (error) {
    if (error instanceof UnfitValue) throw new InputError([unfit(error, medium, tubes)]);
    throw error;
  }
}

function solveUniform(
  answer: FlowAnswer<Dimensions>,
  dimensions: Resolved<Dimensions>,
  medium: UniformMedium,
): Solution {
  const closed = medium.value * answer.uniform(dimensions);
  const { value, lower, upper } = bracket(
    answer,
    dimensions,
    closed,
    CLOSED_FORM_ERROR + medium.relativeError,
  );
  const { boundsBasis, proved } = basis(answer, "rounding", true);
  const { cautions, assumptions } = statements(answer, dimensions);
  return {
    value,
    lower,
    upper,
    boundsBasis,
    proved,
    method: "closed-form",
    cautions,
    assumptions,
    dimensions,
    view: new UniformView(answer, dimensions, medium, closed),
  };
}

/** The flow of a uniform conductor, made only when a check, a plot or a peak asks for it. */
class UniformView implements AlongView {
  readonly kind = "along";
  private madeTubes: FlowTubes | null = null;
  private madeConductor: AlongConductor | null = null;

  constructor(
    readonly answer: FlowAnswer<Dimensions>,
    private readonly dimensions: Resolved<Dimensions>,
    readonly medium: UniformMedium,
    readonly integralOhm: number,
  ) {}

  tubes(): FlowTubes {
    return (this.madeTubes ??= this.answer.flow(this.dimensions));
  }

  conductor(): AlongConductor {
    const { along } = this.tubes();
    return (this.madeConductor ??= new AlongConductor(along, uniformLaw(this.medium.value, along.extent)));
  }
}

function solveAlong(
  answer: FlowAnswer<Dimensions>,
  dimensions: Resolved<Dimensions>,
  medium: GradedMedium,
  tubes: FlowTubes,
): Solution {
  const conductor = new AlongConductor(tubes.along, medium.law);
  const integral = conductor.total();
  const secondIntegral = medium.law.rough ? conductor.secondTotal(integral) : undefined;
  const { relative, cautions } = judge(integral, secondIntegral, medium);
  const { cautions: shapeCautions, assumptions } = statements(answer, dimensions);
  return {
    ...bracket(answer, dimensions, integral.value, relative),
    ...basis(answer, "quadrature", integral.status === "converged"),
    method: "quadrature",
    integral,
    secondIntegral,
    cautions: [...shapeCautions, ...cautions],
    assumptions,
    dimensions,
    view: {
      kind: "along",
      tubes: () => tubes,
      conductor: () => conductor,
      integralOhm: integral.value,
      medium,
      answer,
    },
  };
}

function solveAcross(
  answer: FlowAnswer<Dimensions>,
  dimensions: Resolved<Dimensions>,
  medium: GradedMedium,
  tubes: FlowTubes,
): Solution {
  const flow = tubes.across.find(({ coordinate }) => coordinate === medium.coordinate.name);
  if (!flow)
    throw new Error(`the shape lists ${medium.coordinate.name} across its flow but gives no tubes for it`);
  const conductor = new AcrossConductor(flow, medium.law);
  const integral = conductor.total();
  if (integral.value === 0) {
    const pointer = medium.pointer;
    throw new InputError([{ pointer, detail: "is zero everywhere: nothing would conduct." }]);
  }
  const secondIntegral = medium.law.rough ? conductor.secondTotal(integral) : undefined;
  const { relative, cautions } = judge(integral, secondIntegral, medium);
  const { cautions: shapeCautions, assumptions } = statements(answer, dimensions);
  return {
    ...bracket(answer, dimensions, 1 / integral.value, relative),
    ...basis(answer, "quadrature", integral.status === "converged"),
    method: "quadrature",
    integral,
    secondIntegral,
    cautions: [...shapeCautions, ...cautions],
    assumptions,
    dimensions,
    view: { kind: "across", tubes, conductor, medium, answer },
  };
}

/** From the flow-tube value to the bounds that the shape's end faces or its stated accuracy leave. */
function bracket(
  answer: FlowAnswer<Dimensions>,
  dimensions: Resolved<Dimensions>,
  sheets: number,
  relative: number,
): Bounds {
  if (answer.wallRatio) {
    // Conducting sheets give the lower value, insulating walls the upper one; the middle is as good as any between.
    const upper = sheets * answer.wallRatio(dimensions);
    return between(sheets + (upper - sheets) / 2, sheets, upper, relative);
  }
  if (answer.accuracy) {
    const { lowerRatio, upperRatio } = answer.accuracy(dimensions);
    return between(sheets, sheets * lowerRatio, sheets * upperRatio, relative);
  }
  return around(sheets, relative);
}

function basis(
  answer: FlowAnswer<Dimensions>,
  exact: "rounding" | "quadrature",
  converged: boolean,
): Pick<Solution, "boundsBasis" | "proved"> {
  if (answer.wallRatio) return { boundsBasis: "rayleigh", proved: converged };
  if (answer.accuracy) return { boundsBasis: "formula-accuracy", proved: false };
  return { boundsBasis: exact, proved: exact === "rounding" };
}

function statements(
  answer: FlowAnswer<Dimensions>,
  dimensions: Resolved<Dimensions>,
): Pick<Solution, "cautions" | "assumptions"> {
  const accuracy = answer.accuracy?.(dimensions);
  const own = answer.cautions?.(dimensions) ?? NONE;
  return {
    cautions: accuracy?.cautions ? [...accuracy.cautions, ...own] : own,
    assumptions: accuracy?.accuracy ? [accuracy.accuracy] : NONE,
  };
}

/** How far the integral can be trusted. @throws InputError where it cannot be at all. */
function judge(
  integral: Integral,
  second: Integral | undefined,
  medium: GradedMedium,
): { relative: number; cautions: readonly string[] } {
  const { value, status, evaluations } = integral;
  let relative = integral.error / value;
  if (second) relative = Math.max(relative, second.error / value, Math.abs(second.value - value) / value);
  if (!Number.isFinite(value) || value <= 0) return { relative: QUADRATURE_FLOOR, cautions: [] };
  if (!(relative <= WORST_RELATIVE_ERROR)) {
    const detail = `varies too fast to be integrated: after ${evaluations} evaluations the error is still about ${(100 * relative).toPrecision(2)} %.`;
    throw new InputError([{ pointer: lawPointer(medium), detail }]);
  }
  const limited = status === "limit" || relative > PROMISED_ACCURACY;
  return {
    relative: relative + QUADRATURE_FLOOR,
    cautions: limited
      ? [
          `The integral over ${medium.coordinate.name} reached a relative error of about ${relative.toExponential(1)} only; the bounds include it.`,
        ]
      : [],
  };
}

function lawPointer(medium: GradedMedium): string {
  return medium.law.rough ? pointerTo(medium.pointer, "value") : medium.pointer;
}

function unfit(
  error: UnfitValue,
  medium: GradedMedium,
  tubes: FlowTubes,
): { pointer: string; detail: string } {
  const { name, unit, role } = medium.coordinate;
  const flow = role === "along" ? tubes.along : tubes.across.find(({ coordinate }) => coordinate === name);
  const at = flow
    ? `s = ${siText(flow.start + error.x, unit)} (u = ${Number((error.x / flow.extent).toPrecision(6))})`
    : "some place";
  const what = Number.isNaN(error.value)
    ? "is not a real number"
    : Number.isFinite(error.value)
      ? `is ${error.value}`
      : "is infinite";
  const rule =
    role === "along" ? "must be finite and greater than 0 along the flow" : "must be finite and 0 or greater";
  return { pointer: lawPointer(medium), detail: `${what} at ${at}; it ${rule}.` };
}
