import { catalogue } from "@/lib/engine";
import type { Block, DocPage } from "./page";

type Family = (typeof catalogue)[number]["family"];

/** Links to the shapes of a family. */
function shapesOf(family: Family): Block {
  const links = catalogue
    .filter((shape) => shape.family === family)
    .map(({ id, title }) => `[${title}](/docs/shapes/${id})`);
  return `Shapes: ${links.join(", ")}.`;
}

export const methods: DocPage = {
  slug: "methods",
  title: "Methods",
  summary: "How each family of shapes is computed, where it holds, and how it was tested.",
  sections: () => [
    {
      id: "common",
      title: "What all have in common",
      blocks: [
        "Direct current, perfect terminals (each at one potential over its whole face), a medium whose conductivity does not depend on the current. Every shape’s page repeats its own assumptions and where it holds.",
        "Where the current has one direction, the resistance is an integral of the resistivity over the section:",
        { tex: "R = \\int \\frac{\\rho(s)}{A(s)}\\,\\mathrm{d}s" },
        "Closed forms are written so that nothing cancels: a thin wall or a small gap keeps its digits. Integrals without a closed form are computed by Gauss–Kronrod quadrature, with the error estimate as bounds.",
      ],
    },
    {
      id: "axial",
      title: "Along a constant section",
      blocks: [
        { tex: "R = \\frac{\\rho L}{A}" },
        "Exact for straight conductors whose ends are terminals. Windings and strands use the length of the path; what that leaves out stands on the shape’s page.",
        shapesOf("axial"),
      ],
    },
    {
      id: "tapered",
      title: "Along a tapering section",
      blocks: [
        "Between flat ends the current of a taper spreads, and no closed form exists. Two theorems of Rayleigh give a bracket: laying perfectly conducting sheets across the flow can only lower the resistance, laying insulating walls along it can only raise it. Both cases can be computed.",
        shapesOf("tapered"),
      ],
    },
    {
      id: "radial",
      title: "Radial and around a bend",
      blocks: [
        "Between nested surfaces, or around a bend with terminals across it, orthogonal coordinates separate the problem and the law is exact:",
        { tex: "R = \\frac{\\rho}{2\\pi L}\\ln\\frac{b}{a}" },
        shapesOf("radial"),
      ],
    },
    {
      id: "spreading",
      title: "Spreading and leakage",
      blocks: [
        "Two electrodes in a medium, or a contact on a large body. The formulas come from potential theory: images, bispherical and bipolar coordinates, elliptic integrals. A series is summed until the rest is below rounding.",
        shapesOf("spreading"),
      ],
    },
    {
      id: "sheet",
      title: "Sheet patterns",
      blocks: [
        "Plan shapes in a thin layer, counted in squares. Corners and steps follow from conformal maps, as long as the legs are long enough that the corner does not feel their ends; patterns with shorter legs are answered by a field solution on their plan.",
        shapesOf("sheet"),
      ],
    },
    {
      id: "earthing",
      title: "Earthing",
      blocks: [
        "Electrodes in the ground, by the resistivity of the soil. Some formulas are exact for their model, others are published with a stated accuracy, which then is their bounds.",
        {
          caution:
            "An earthing resistance is no proof of safety. Touch and step voltage, fault duration and current are for the local code and a competent engineer, and soil varies by season and place: measure it.",
        },
        shapesOf("earthing"),
      ],
    },
    {
      id: "fields",
      title: "Field solutions",
      blocks: [
        "On an outline the engine solves for the potential and for the stream function on the same mesh of triangles, by finite elements of higher order. By the principles of Dirichlet and Thomson the energies of the two bound the resistance from both sides, whatever the mesh and however exactly the linear systems were solved. The mesh is refined where the two differ.",
        "At a re-entrant corner the field is singular. That slows the bracket down and does not make it wrong.",
      ],
    },
    {
      id: "not",
      title: "What is not computed",
      blocks: [
        {
          list: [
            "Alternating current: skin and proximity effect, inductance, capacitance, impedance at any frequency.",
            "A conductivity that depends on direction, on the field strength or on the current.",
            "The resistance of a joint between two faces, beyond the constriction of a [contact spot](/docs/shapes/contact-spot): terminals are perfect. A measured joint is an element of a [network](/docs/networks).",
            "Heating: the temperature is an [input](/docs/operating-point).",
          ],
        },
      ],
    },
    {
      id: "tests",
      title: "How it is tested",
      blocks: [
        "Against arithmetic of 50 digits and more, against second methods, and against published values, each beside its source. The [accuracy table](/docs/accuracy) is written from the tests’ own results; a test fails if the engine becomes worse than its row. Beside that every shape is tried with random dimensions over many decades, at its limits, and rescaled.",
      ],
    },
    {
      id: "safety",
      title: "Safety",
      blocks: [
        {
          caution:
            "Results are DC resistances under the stated assumptions and no proof of compliance. Ampacity, temperature rise, insulation, protection, touch and step voltage are for the local code and a licensed or otherwise competent engineer. Material data is nominal unless your team measured it.",
        },
        "Cautions are part of a shape and of each answer. If you show a resistance to others, show its cautions with it.",
      ],
    },
  ],
};
