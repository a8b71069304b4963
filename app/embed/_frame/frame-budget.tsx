"use client";

import { ShareBar } from "../../_ui/share-bar";
import { filled } from "../_words/words";
import type { FrameResult, FrameTolerances, FrameView } from "./frame-view";
import { localShare } from "./local-number";

interface BudgetProps {
  readonly view: FrameView;
  readonly tolerances: FrameTolerances;
  readonly result: FrameResult;
}

/** What each input contributes to the range; loaded only where the widget shows it. */
export function FrameBudget({ view: { words, locale }, tolerances, result }: BudgetProps) {
  const { uncertainty, resistance } = result;
  if (!uncertainty || !resistance) return null;
  const rows = rowsOf(uncertainty.contributions, tolerances.labels, words.notShown);
  const title = tolerances.method === "worst-case" ? words.shareOfRange : words.share;
  const standard = localShare(uncertainty.standard / resistance.value, locale);
  return (
    <section className="mt-2 border-t border-rule pt-1" aria-label={words.budget}>
      <h2 className="text-table! font-semibold">{words.budget}</h2>
      {rows.length === 0 ? (
        <p className="text-table">{words.noTolerance}</p>
      ) : (
        <table className="w-full table-fixed text-table" data-testid="budget">
          <thead>
            <tr className="border-b border-edge">
              <th scope="col" className="py-0.5 pe-1.5 text-start font-medium">
                {words.ofInput}
              </th>
              <th scope="col" className="py-0.5 text-start font-medium">
                {title}
              </th>
            </tr>
          </thead>
          <tbody>
            {rows.map(({ label, share }) => (
              <tr key={label} className="border-b border-rule">
                <th scope="row" className="py-0.5 pe-1.5 text-start font-normal hyphens-auto wrap-anywhere">
                  {label}
                </th>
                <td className="py-0.5">
                  <ShareBar share={share} text={localShare(share, locale)} />
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
      <p className="mt-0.5 text-small text-ink-soft">{filled(words.standard, standard)}</p>
    </section>
  );
}

interface Row {
  readonly label: string;
  readonly share: number;
}

/** The largest first; what the widget hides is one entry without a name, at the end. */
function rowsOf(
  contributions: NonNullable<FrameResult["uncertainty"]>["contributions"],
  labels: FrameTolerances["labels"],
  rest: string,
): readonly Row[] {
  const shown = contributions.filter(({ input }) => Object.hasOwn(labels, input));
  const hidden = contributions.filter((entry) => !shown.includes(entry));
  const rows = shown.map(({ input, share }) => ({ label: labels[input], share }));
  return hidden.length === 0
    ? rows
    : [...rows, { label: rest, share: hidden.reduce((sum, { share }) => sum + share, 0) }];
}
