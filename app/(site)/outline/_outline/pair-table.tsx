import { bracketText } from "../../../_ui/bracket";
import type { FieldView } from "../_model/field-view";

type Pair = NonNullable<NonNullable<FieldView["result"]>["pairs"]>[number];

/** Each pair of three terminals or more, with the others left open and with the others at zero. */
export function PairTable({ pairs }: { readonly pairs: readonly Pair[] }) {
  return (
    <div
      tabIndex={0}
      role="group"
      aria-label="Resistances of the pairs"
      className="overflow-x-auto rounded border border-rule"
    >
      <table className="w-full border-collapse text-table" data-testid="pairs">
        <thead className="text-small text-ink-soft">
          <tr>
            <th scope="col" className="px-1 text-start font-normal">
              Between
            </th>
            <th scope="col" className="px-1 text-start font-normal">
              Others open
            </th>
            <th scope="col" className="px-1 text-start font-normal">
              Others at zero
            </th>
          </tr>
        </thead>
        <tbody>
          {pairs.map(({ between, floating, grounded }) => (
            <tr key={between.join(" ")} className="border-t border-rule align-top">
              <th scope="row" className="px-1 py-0.5 text-start font-normal">
                {between.join(" – ")}
              </th>
              <Cell pair={floating} />
              <Cell pair={grounded} />
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

function Cell({ pair }: { readonly pair: Pair["floating"] }) {
  const { value, upper, lower, text } = pair;
  const bracket = value === null || upper === null ? null : bracketText(value, lower, upper, "Ω");
  return (
    <td className="px-1 py-0.5 font-mono">
      {text}
      {bracket ? (
        <span className="block text-small text-ink-soft">
          [{bracket.lower} … {bracket.upper}] {bracket.unit}
        </span>
      ) : null}
    </td>
  );
}
