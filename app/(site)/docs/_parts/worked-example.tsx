import type { ResistanceResult } from "@/lib/engine";
import { SiteLink } from "../../../_ui/site/site-link";
import { Tex } from "../../../_ui/tex";

/** The shape's example as the engine computes it now. */
export function WorkedExample({ result }: { readonly result: ResistanceResult }) {
  const { resistance, steps = [], method, cautions } = result;
  return (
    <>
      <p>
        With the dimensions of the drawing: <strong>{resistance.text}</strong>, between{" "}
        <span className="font-mono">{exact(resistance.lower)}</span> and{" "}
        <span className="font-mono">{exact(resistance.upper)}</span>&#8239;Ω. Method {method}, bounds{" "}
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
      {cautions.length > 0 ? (
        <ul>
          {cautions.map((text) => (
            <li key={text}>{text}</li>
          ))}
        </ul>
      ) : null}
    </>
  );
}

/** All digits that a double holds, with the exponent where the number is long. */
function exact(value: number): string {
  return String(Number(value.toPrecision(15)));
}
