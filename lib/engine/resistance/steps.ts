/** How the number came about, step by step, as TeX with the values at this operating point. */
import { formatQuantity, siText, texNumber } from "../quantity/format-quantity";
import type { Coordinate, Shape } from "../shape/define-shape";
import type { ResistanceResult, Step } from "./result-schema";
import { UnfitValue } from "./law-integral";
import type { AcrossView, AlongView, Solution } from "./solution";

/** The steps of one answer: coordinates, medium, potential, field, current density, current, resistance. */
export function listSteps(
  solution: Solution,
  shape: Shape,
  operating: ResistanceResult["operating"],
): Step[] {
  const { view } = solution;
  const last = resistanceStep(solution, shape);
  const current = currentStep(solution, operating);
  switch (view.kind) {
    case "along":
      return [...alongSteps(view, shape, solution.value, operating.voltage), current, last];
    case "across":
      return [...acrossSteps(view, shape, operating.voltage), current, last];
    case "factor":
      return [
        { title: "Medium", tex: view.medium.tex() },
        {
          title: "Shape factor",
          tex: view.sheet ? "R = R_\\square\\,n_\\square" : "R = \\rho\\,k",
          value: view.sheet
            ? `${Number(view.factor.value.toPrecision(6))} squares`
            : `${Number(view.factor.value.toPrecision(6))}\u2009m⁻¹`,
        },
        current,
        last,
      ];
    case "media":
      return [
        {
          title: "Media",
          tex: Object.entries(view.resistivities ?? {})
            .map(([name, value]) => `\\rho_\\mathrm{${name}} = ${texNumber(value)}\\,\\Omega\\,\\mathrm{m}`)
            .join(",\\quad "),
        },
        current,
        last,
      ];
  }
}

function coordinateOf(shape: Shape, name: string): Coordinate | undefined {
  return shape.coordinates.find((coordinate) => coordinate.name === name);
}

/** A value at both ends of a range, or what holds at either; left out where the medium ends in nothing there. */
function atEnds(symbol: string, [start, end]: readonly [string, string], at: () => [string, string]) {
  try {
    const [first, last] = at();
    return first === last ? first : `${first} at ${symbol} = ${start}, ${last} at ${symbol} = ${end}`;
  } catch (error) {
    if (error instanceof UnfitValue) return undefined;
    throw error;
  }
}

function alongSteps(view: AlongView, shape: Shape, resistance: number, voltage: number | undefined): Step[] {
  const { along } = view.tubes();
  const conductor = view.conductor();
  const coordinate = coordinateOf(shape, along.coordinate);
  const unit = coordinate?.unit ?? "m";
  const curved = along.scale !== undefined;
  const section = curved ? "S(s) = \\iint \\frac{h_2 h_3}{h_1}\\,dv\\,dw" : "A(s)";
  const area = curved ? "S" : "A";
  const field = curved ? "E(s) = -\\frac{1}{h_1}\\frac{dV}{ds}" : "E(s) = -\\frac{dV}{ds}";
  const rho = view.medium.kind === "graded" ? "\\rho(s)" : "\\rho";
  const volts = voltage ?? 1;
  const ends = [siText(along.start, unit, 6), siText(along.start + along.extent, unit, 6)] as const;
  const density = (x: number) => volts / resistance / (along.section(x) * (along.scale?.(x) ?? 1));
  const both = (quantity: "V/m" | "A/m^2", of: (x: number) => number) =>
    atEnds("s", ends, () => [formatQuantity(of(0), quantity), formatQuantity(of(along.extent), quantity)]);
  const where = along.line ? ` (${along.line})` : "";
  const told = (text: string | undefined) =>
    text === undefined ? {} : { value: text + where + per(voltage) };
  return [
    {
      title: "Coordinates",
      tex: `s = \\text{${coordinate?.label ?? along.coordinate}},\\quad s_0 \\le s \\le s_1,\\quad \\text{section } ${section}`,
      value: `s from ${ends[0]} to ${ends[1]}`,
    },
    mediumStep(view),
    {
      title: "Potential",
      tex: `V(s) = V_0\\left(1 - \\frac{\\int_{s_0}^{s} ${rho}\\,ds'/${area}(s')}{\\int_{s_0}^{s_1} ${rho}\\,ds'/${area}(s')}\\right)`,
      value: `from ${formatQuantity(volts, "volt")} at s = ${ends[0]} to 0\u2009V at s = ${ends[1]}`,
    },
    {
      title: "Field",
      tex: field,
      ...told(both("V/m", (x) => density(x) * conductor.resistivityAt(x))),
    },
    {
      title: "Current density",
      tex: view.medium.kind === "graded" ? "J(s) = \\frac{E(s)}{\\rho(s)}" : "J(s) = \\frac{E(s)}{\\rho}",
      ...told(both("A/m^2", density)),
    },
  ];
}

/** Said where no voltage was given. */
function per(voltage: number | undefined): string {
  return voltage === undefined ? ", at 1\u2009V" : "";
}

function acrossSteps(view: AcrossView, shape: Shape, voltage: number | undefined): Step[] {
  const { flow } = view.conductor;
  const coordinate = coordinateOf(shape, flow.coordinate);
  const unit = coordinate?.unit ?? "m";
  const volts = voltage ?? 1;
  const ends = [siText(flow.start, unit, 6), siText(flow.start + flow.extent, unit, 6)] as const;
  const both = (quantity: "V/m" | "A/m^2", of: (x: number) => number) => {
    const text = atEnds("t", ends, () => [
      formatQuantity(of(0), quantity),
      formatQuantity(of(flow.extent), quantity),
    ]);
    return text === undefined ? {} : { value: text + per(voltage) };
  };
  const field = (x: number) => volts * flow.fieldPerVolt(x);
  return [
    {
      title: "Coordinates",
      tex: `t = \\text{${coordinate?.label ?? flow.coordinate}},\\quad t_0 \\le t \\le t_1,\\quad \\text{tubes of width } w(t) \\text{ and length } l(t)`,
      value: `t from ${ends[0]} to ${ends[1]}`,
    },
    mediumStep(view),
    {
      title: "Potential",
      tex: "V \\text{ falls along the flow only; every tube has the same drop } V_0",
      value: formatQuantity(volts, "volt"),
    },
    { title: "Field", tex: "E(t) = \\frac{V_0}{l(t)}", ...both("V/m", field) },
    {
      title: "Current density",
      tex: "J(t) = \\sigma(t)\\,E(t)",
      ...both("A/m^2", (x) => field(x) * view.conductor.conductivityAt(x)),
    },
  ];
}

function mediumStep(view: AlongView | AcrossView): Step {
  const { medium } = view;
  if (medium.kind === "uniform") return { title: "Medium", tex: medium.tex() };
  const { law } = medium;
  const symbol = law.quantity === "resistivity" ? "\\rho" : "\\sigma";
  return {
    title: `Medium: ${medium.title.toLowerCase()} profile`,
    tex: `${medium.tex}\\qquad ${symbol}:\\ ${law.tex}`,
  };
}

function currentStep(solution: Solution, operating: ResistanceResult["operating"]): Step {
  const across = solution.view.kind === "across";
  const tex = across ? "I = V_0 \\int_{t_0}^{t_1} \\sigma(t)\\,\\frac{w(t)}{l(t)}\\,dt" : "I = \\iint J\\,dA";
  if (operating.voltage === undefined || operating.current === undefined) {
    return { title: "Current", tex, value: `${formatQuantity(1 / solution.value, "ampere")} at 1\u2009V` };
  }
  return {
    title: "Current",
    tex,
    value: `${formatQuantity(operating.current, "ampere")} at ${formatQuantity(operating.voltage, "volt")}`,
  };
}

function resistanceStep(solution: Solution, shape: Shape): Step {
  const { value, lower, upper, view } = solution;
  const text = formatQuantity(value, "ohm", { lower, upper });
  const bracket = ` [${formatQuantity(lower, "ohm")} … ${formatQuantity(upper, "ohm")}]`;
  const tex =
    view.kind === "across"
      ? "R = \\frac{V_0}{I} = \\left(\\int_{t_0}^{t_1} \\sigma(t)\\,\\frac{w(t)}{l(t)}\\,dt\\right)^{-1}"
      : view.kind === "along" && view.medium.kind === "graded"
        ? "R = \\frac{V_0}{I} = \\int_{s_0}^{s_1} \\frac{\\rho(s)}{A(s)}\\,ds"
        : shape.formula;
  const wide = (upper - lower) / value > 1e-6;
  return { title: "Resistance", tex, value: wide ? text + bracket : text };
}
