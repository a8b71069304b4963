/** How the number came about, step by step, as TeX with the values at this operating point. */
import { formatQuantity, siText, texNumber } from "../quantity/format-quantity";
import type { Coordinate, Shape } from "../shape/define-shape";
import type { ResistanceResult, Step } from "./result-schema";
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
      return [...alongSteps(view, shape), current, last];
    case "across":
      return [...acrossSteps(view, shape), current, last];
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

function alongSteps(view: AlongView, shape: Shape): Step[] {
  const { along } = view.tubes();
  const coordinate = coordinateOf(shape, along.coordinate);
  const unit = coordinate?.unit ?? "m";
  const curved = along.scale !== undefined;
  const section = curved ? "S(s) = \\iint \\frac{h_2 h_3}{h_1}\\,dv\\,dw" : "A(s)";
  const area = curved ? "S" : "A";
  const field = curved ? "E(s) = -\\frac{1}{h_1}\\frac{dV}{ds}" : "E(s) = -\\frac{dV}{ds}";
  const rho = view.medium.kind === "graded" ? "\\rho(s)" : "\\rho";
  return [
    {
      title: "Coordinates",
      tex: `s = \\text{${coordinate?.label ?? along.coordinate}},\\quad s_0 \\le s \\le s_1,\\quad \\text{section } ${section}`,
      value: `s from ${siText(along.start, unit, 6)} to ${siText(along.start + along.extent, unit, 6)}`,
    },
    mediumStep(view),
    {
      title: "Potential",
      tex: `V(s) = V_0\\left(1 - \\frac{\\int_{s_0}^{s} ${rho}\\,ds'/${area}(s')}{\\int_{s_0}^{s_1} ${rho}\\,ds'/${area}(s')}\\right)`,
    },
    { title: "Field", tex: field },
    {
      title: "Current density",
      tex: view.medium.kind === "graded" ? "J(s) = \\frac{E(s)}{\\rho(s)}" : "J(s) = \\frac{E(s)}{\\rho}",
    },
  ];
}

function acrossSteps(view: AcrossView, shape: Shape): Step[] {
  const { flow } = view.conductor;
  const coordinate = coordinateOf(shape, flow.coordinate);
  const unit = coordinate?.unit ?? "m";
  return [
    {
      title: "Coordinates",
      tex: `t = \\text{${coordinate?.label ?? flow.coordinate}},\\quad t_0 \\le t \\le t_1,\\quad \\text{tubes of width } w(t) \\text{ and length } l(t)`,
      value: `t from ${siText(flow.start, unit, 6)} to ${siText(flow.start + flow.extent, unit, 6)}`,
    },
    mediumStep(view),
    { title: "Potential", tex: "V \\text{ falls along the flow only; every tube has the same drop } V_0" },
    { title: "Field", tex: "E(t) = \\frac{V_0}{l(t)}" },
    { title: "Current density", tex: "J(t) = \\sigma(t)\\,E(t)" },
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
