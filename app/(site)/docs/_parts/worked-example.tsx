import type { ResistanceResult } from "@/lib/engine";
import { SiteLink } from "../../../_ui/site/site-link";
import { Tex } from "../../../_ui/tex";

/** The shape's example as the engine computes it now. */
export function WorkedExample({ result }: { readonly result: ResistanceResult }) {
  const { resistance, steps = [], method } = result;
  return (
    <>
      <p>
        With the dimensions of the drawing: <strong>{resistance.text}</strong>, between{" "}
        <span className="font-mono">{digits(resistance.lower)}</span> and{" "}
        <span className="font-mono">{digits(resistance.upper)}</span>&#8239;Ω. Method {method}, bounds{" "}
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

/** Enough digits to see how far the bounds lie apart. */
function digits(value: number): string {
  return String(Number(value.toPrecision(12)));
}
