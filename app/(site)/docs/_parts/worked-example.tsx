import type { ResistanceResult } from "@/lib/engine";
import { bracketText } from "../../../_ui/bracket";
import { SiteLink } from "../../../_ui/site/site-link";
import { Tex } from "../../../_ui/tex";

/** The shape's example as the engine computes it now. */
export function WorkedExample({ result }: { readonly result: ResistanceResult }) {
  const { resistance, steps = [], method } = result;
  const { lower, upper, unit } = bracketText(resistance.value, resistance.lower, resistance.upper, "Ω");
  return (
    <>
      <p>
        With the dimensions of the drawing: <strong>{resistance.text}</strong>, between{" "}
        <span className="font-mono">{lower}</span> and <span className="font-mono">{upper}</span>&#8239;
        {unit}. Method {method}, bounds{" "}
        <SiteLink href="/docs/bounds#bases">{resistance.boundsBasis}</SiteLink>,{" "}
        {resistance.proved ? "proved" : "not proved"}.
      </p>
      <ol>
        {steps.map(({ title, tex, value }, index) => (
          <li key={index}>
            {title}
            {value ? `: ${value}` : ""}
            <Tex tex={tex} display />
          </li>
        ))}
      </ol>
    </>
  );
}
