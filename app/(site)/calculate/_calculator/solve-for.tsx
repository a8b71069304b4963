"use client";

import { useEffect, useState } from "react";
import useSWR from "swr";
import type { SizingResult } from "@/lib/engine/resistance/sizing/sizing-schema";
import { Button } from "../../../_ui/button";
import { QuantityInput } from "../../../_ui/quantity-input";
import { Select } from "../../../_ui/select";
import { ApiProblem, postApi } from "../../_live/call-api";
import { type Complaint, sentence, sortComplaints } from "../_model/complaints";
import { dimensionGroups } from "../_model/parameters";
import { noTolerance } from "../_model/tolerances";
import { sizingBody } from "../_model/sizing";
import { parameterLabel } from "./compare/parameter-words";
import { kindOf, memberText } from "./dimension-fields";
import { useForm } from "./form-context";
import { SaveRecord, type Saving } from "./save-record";

const PAUSE_MS = 300;
const FEW_DIGITS = 12;
const ALL_DIGITS = 17;

interface SolveForProps {
  readonly saving: Saving | undefined;
  /** Path that leads back to the page's state. */
  readonly back: () => string;
}

/** The other way round: the dimension that gives a resistance, and one press puts it in. */
export function SolveFor({ saving, back }: SolveForProps) {
  const { entry, dimensions, parameters, change } = useForm();
  const { solveFor } = parameters;
  const findable = dimensions.filter(({ type }) => type !== "choice");
  const chosen = findable.find(({ name }) => name === solveFor);
  const body = sizingBody(entry, parameters);
  const asked = usePaused(body ? JSON.stringify({ ...body, include: [] }) : null);
  const { data, error, isValidating } = useSWR<SizingResult, Error>(
    asked === null ? null : ["/sizing", asked],
    ([path, text]: [string, string]) => postApi<SizingResult>(path, text),
    {
      keepPreviousData: false,
      revalidateIfStale: false,
      revalidateOnFocus: false,
      shouldRetryOnError: false,
    },
  );
  const complaints: readonly Complaint[] =
    error instanceof ApiProblem && error.status === 422 ? (error.problem.errors ?? []) : [];
  const { atField, elsewhere } = sortComplaints(complaints);
  const own = ["solveFor", "target", "from", "to"];
  // Their fields are far above, so each is told with its field's name.
  const others = [...atField]
    .filter(([name]) => !own.includes(name))
    .map(([name, detail]) => {
      const { label } = parameterLabel(name.split("/")[0], entry, dimensions);
      return `${label}: ${detail.charAt(0).toLowerCase()}${detail.slice(1)}`;
    });

  const use = ({ value, text }: SizingResult["within"][number]): void => {
    if (!chosen) return;
    const group = dimensionGroups(entry).find((names) => names.includes(chosen.name)) ?? [chosen.name];
    const cleared = Object.fromEntries(
      group.flatMap((name) => [[name, undefined] as const, ...Object.entries(noTolerance(name))]),
    );
    change({
      ...cleared,
      [chosen.name]: memberText(
        chosen,
        value,
        group.map((name) => parameters[name]).find(Boolean),
        // A text of that many digits would be rounded away: a thin wall by two radii.
        text.replace(/\D/g, "").length >= FEW_DIGITS ? ALL_DIGITS : FEW_DIGITS,
      ),
    });
  };

  return (
    <section aria-labelledby="solve-for" className="mt-5 border-t border-rule pt-3 print:hidden">
      <h2 id="solve-for" className="mb-0.5">
        Find a dimension
      </h2>
      <p className="mb-1 max-w-prose text-table text-ink-soft">
        Choose what may change and the resistance it is to give; everything else stays as it is above.
      </p>
      <div className="grid max-w-[60rem] gap-x-2 narrow:grid-cols-2 wide:grid-cols-4">
        <Select
          label="Find"
          value={solveFor ?? ""}
          error={atField.get("solveFor")}
          options={[
            { value: "", label: "Choose …" },
            ...findable.map(({ name, label, symbol }) => ({
              value: name,
              label: symbol === "" ? label : `${label} (${symbol})`,
            })),
          ]}
          onChange={(event) =>
            change({ solveFor: event.target.value || undefined, from: undefined, to: undefined })
          }
        />
        <QuantityInput
          name="target"
          label="for a resistance of"
          kind="resistance"
          bareUnit="ohm"
          value={parameters.target ?? ""}
          error={atField.get("target")}
          onChange={(text) => change({ target: text === "" ? undefined : text })}
        />
        {chosen
          ? (["from", "to"] as const).map((name) => (
              <QuantityInput
                key={name}
                name={name}
                label={name === "from" ? "between" : "and"}
                kind={kindOf(chosen)}
                bareUnit={chosen.unit === "1" ? undefined : (chosen.unit ?? undefined)}
                placeholder="any"
                value={parameters[name] ?? ""}
                error={atField.get(name)}
                onChange={(text) => change({ [name]: text === "" ? undefined : text })}
              />
            ))
          : null}
      </div>
      <div aria-live="polite" aria-busy={isValidating} className="min-h-5">
        {body && !error && data && chosen ? (
          <>
            <Solutions result={data} label={chosen.label} whole={chosen.type === "integer"} onUse={use} />
            {saving ? (
              <div className="mt-1">
                <SaveRecord
                  saving={saving}
                  path="/sizing"
                  body={body}
                  title={`${entry.title}: ${chosen.label.toLowerCase()} for ${parameters.target ?? ""}`}
                  back={back}
                  action="Save what was found"
                />
              </div>
            ) : null}
          </>
        ) : null}
        {body && [...others, ...elsewhere.map(({ detail }) => sentence(detail))].length > 0 ? (
          <p className="text-table text-oxide">
            {[...others, ...elsewhere.map(({ detail }) => sentence(detail))].join(" ")}
          </p>
        ) : null}
        {error && complaints.length === 0 ? (
          <p className="text-table text-oxide">
            {error instanceof ApiProblem
              ? error.message
              : "The service cannot be reached; change a field to try again."}
          </p>
        ) : null}
      </div>
    </section>
  );
}

interface SolutionsProps {
  readonly result: SizingResult;
  readonly label: string;
  /** Whether what is looked for is a whole number. */
  readonly whole: boolean;
  readonly onUse: (found: SizingResult["within"][number]) => void;
}

function Solutions({ result, label, whole, onUse }: SolutionsProps) {
  const { solutions, within } = result;
  const beside = whole && !solutions.every((solution) => solution.exact);
  const [least, most] = within;
  return (
    <>
      <p className="mb-0.5 text-table">
        {beside
          ? "No whole number gives it exactly; these are the nearest on either side."
          : solutions.length === 1
            ? "One solution"
            : `${solutions.length} solutions, smallest first,`}
        {beside ? null : (
          <>
            {" between "}
            <span className="font-mono">{least.text}</span> and <span className="font-mono">{most.text}</span>
            .
          </>
        )}
      </p>
      <ul className="grid gap-1" data-testid="solutions">
        {solutions.map(({ dimension, resistance, sensitivity, exact, cautions }) => (
          <li key={dimension.value} className="flex flex-wrap items-center gap-x-2 gap-y-0.5">
            <span className="font-mono text-lead font-medium">{dimension.text}</span>
            <span className="text-table text-ink-soft">
              gives <span className="font-mono">{resistance.text}</span>
              {whole ? null : `; ${slopeText((sensitivity * dimension.value) / resistance.value)}`}
            </span>
            <Button
              aria-label={`Use ${label.toLowerCase()} ${dimension.text}`}
              onClick={() => onUse(dimension)}
            >
              Use it
            </Button>
            {!exact && !whole ? <p className="w-full max-w-prose text-table">{cautions.at(-1)}</p> : null}
          </li>
        ))}
      </ul>
    </>
  );
}

/** How the resistance moves there, by which two solutions differ: relative change over relative change. */
function slopeText(slope: number): string {
  if (!Number.isFinite(slope) || Math.abs(slope) < 5e-4) return "around it the resistance hardly moves";
  const size = Number(Math.abs(slope).toPrecision(2));
  return `1 % more makes it ${size} % ${slope > 0 ? "larger" : "smaller"}`;
}

/** The text once typing has paused. */
function usePaused(text: string | null): string | null {
  const [asked, setAsked] = useState(text);
  useEffect(() => {
    const timer = setTimeout(() => setAsked(text), PAUSE_MS);
    return () => clearTimeout(timer);
  }, [text]);
  return text === null ? null : asked;
}
