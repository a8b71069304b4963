"use client";

import { type ReactNode, useMemo, useState } from "react";
import { SWRConfig } from "swr";
import type { ShapeEntry } from "@/lib/engine";
import { LiveRegion } from "../../../_ui/live-region";
import { ToastArea } from "../../../_ui/toast";
import { splitAddress } from "../_model/address";
import { parameterAt, sortComplaints } from "../_model/complaints";
import { mediumKind, mediumPrefixes, type Parameters } from "../_model/parameters";
import { INCLUDE, plainDimensions, requestBody } from "../_model/request";
import { type PageState, stateQuery } from "../_model/variants";
import type { FirstAnswer } from "../_server/first-answer";
import type { FormDimension, ProfileFacts } from "../_server/form-facts";
import type { Geometry } from "../_server/geometry";
import type { MaterialChoice } from "../_server/material-choices";
import { AnswerStrip } from "./answer/headline";
import { Outcome, Particulars } from "./answer/outcome";
import { CompareTable } from "./compare/compare-table";
import { VariantBar } from "./compare/variant-bar";
import { Details } from "./details";
import { DimensionFields } from "./dimension-fields";
import { DrawingPane } from "./drawing-pane";
import { Elsewhere } from "./elsewhere";
import { FormProvider, type FormState } from "./form-context";
import { pathBack } from "./kept-address";
import { MediumFields } from "./medium-fields";
import { OperatingFields } from "./operating-fields";
import { PageTools } from "./page-tools";
import { RequirementFields } from "./requirement-fields";
import { SolveFor } from "./solve-for";
import { UncertaintyFields } from "./uncertainty-fields";
import { SaveRecord, type Saving } from "./save-record";
import { useAnswers } from "./use-answers";
import { useGeometry } from "./use-geometry";
import { useMaterials } from "./use-materials";
import { usePageState } from "./use-page-state";

interface CalculatorProps {
  /** What the page is about: its title and what leads back. */
  readonly heading: ReactNode;
  readonly entry: ShapeEntry;
  readonly dimensions: readonly FormDimension[];
  readonly example: Parameters;
  readonly start: PageState;
  /** Of each variant, as the server found them. */
  readonly answers: readonly (FirstAnswer | null)[];
  readonly geometry: Geometry | null;
  readonly materials: readonly MaterialChoice[];
  readonly profiles: readonly ProfileFacts[];
  readonly origin: string;
  /** The law, typeset. */
  readonly formula: ReactNode;
  /** How the reader may keep a calculation; left out where nobody can. */
  readonly saving?: Saving;
}

/** One shape: its fields, its drawing, its answer while the fields change, and what stands behind the answer. */
export function Calculator(props: CalculatorProps) {
  return (
    <SWRConfig value={{ dedupingInterval: 500 }}>
      <ToastArea>
        <LiveCalculator {...props} />
      </ToastArea>
    </SWRConfig>
  );
}

function LiveCalculator(props: CalculatorProps) {
  const { entry, dimensions, example, start, origin } = props;
  const [state, actions] = usePageState(start, entry, example);
  const [focused, setFocused] = useState<string>();
  const { variants, active } = state;
  const parameters = variants[active];
  const bodies = useMemo(() => variants.map((variant) => requestBody(entry, variant)), [variants, entry]);
  const answers = useAnswers(
    bodies.map((body) => JSON.stringify({ ...body, include: INCLUDE })),
    props.answers,
  );
  const answer = answers[active];
  const geometry = useGeometry(entry.id, plainDimensions(entry, parameters), props.geometry);
  const materials = useMaterials(parameters.temperature, props.materials);
  const { trouble } = answer;
  const complaints = useMemo(
    () => sortComplaints(trouble?.kind === "input" ? trouble.complaints : []),
    [trouble],
  );

  const form: FormState = useMemo(
    () => ({
      entry,
      dimensions,
      parameters,
      change: actions.change,
      errorAt: (name) => complaints.atField.get(name),
      tolerances: true,
      materials,
      profiles: props.profiles,
      values: geometry?.values ?? {},
      ranges: geometry?.ranges ?? {},
      onFocus: setFocused,
    }),
    [entry, dimensions, parameters, actions.change, complaints, materials, props.profiles, geometry],
  );

  const back = () => pathBack(splitAddress(stateQuery(state, entry)));

  return (
    <FormProvider value={form}>
      <div className="flex flex-wrap items-end gap-x-3 gap-y-1">
        <div className="min-w-0 grow basis-[28rem]">{props.heading}</div>
        <div className="flex flex-wrap items-center gap-0.5 print:hidden">
          <PageTools state={state} entry={entry} actions={actions} />
          {props.saving ? (
            <SaveRecord
              saving={props.saving}
              path="/resistance"
              body={{ ...bodies[active], include: INCLUDE }}
              title={entry.title}
              back={back}
              placeOf={({ pointer = "" }) =>
                dimensions.find(({ name }) => name === parameterAt(pointer))?.label
              }
            />
          ) : null}
        </div>
      </div>
      {variants.length > 1 ? <VariantBar state={state} actions={actions} /> : null}
      <AnswerStrip result={answer.result} stale={answer.stale} outdated={trouble !== undefined} />
      {/* In narrow windows the drawing stands above the fields that come before it: nothing is shown before all is there. */}
      <div className="mt-2 grid items-start gap-x-5 gap-y-3 max-wide:not-has-[>[data-whole]]:invisible wide:grid-cols-[24rem_minmax(0,1fr)]">
        <form
          key={active}
          aria-label="Inputs"
          className="order-2 grid gap-2 wide:order-none [&_:is(input,select,button,textarea)]:scroll-mt-10"
          onSubmit={(event) => event.preventDefault()}
        >
          <DimensionFields />
          <MediumFields />
          <OperatingFields form={form} />
          <RequirementFields form={form} />
          <UncertaintyFields form={form} />
        </form>
        <div className="contents wide:sticky wide:top-2 wide:grid wide:gap-3">
          <Outcome
            answer={answer}
            elsewhere={complaints.elsewhere}
            signedOut={props.saving?.kind === "sign-in"}
            className="order-3 wide:order-none"
          />
          <DrawingPane
            entry={entry}
            geometry={geometry}
            focused={focused}
            outdated={refusedBecause(trouble)}
            className="order-1 wide:order-none"
          />
          <Particulars answer={answer} className="order-4 wide:order-none" />
        </div>
        <span hidden data-whole />
      </div>
      {variants.length > 1 ? (
        <section aria-labelledby="compare" className="mt-4">
          <h2 id="compare" className="mb-1">
            Side by side
          </h2>
          <CompareTable
            entry={entry}
            dimensions={dimensions}
            variants={variants}
            answers={answers}
            active={active}
            materials={materials}
          />
        </section>
      ) : null}
      <SolveFor saving={props.saving} back={back} />
      <Details
        entry={entry}
        result={answer.result}
        formula={props.formula}
        graded={mediumPrefixes(entry).some((prefix) => mediumKind(parameters, prefix) === "graded")}
      />
      <section aria-labelledby="elsewhere" className="mt-5 print:hidden">
        <h2 id="elsewhere" className="mb-1">
          Use this elsewhere
        </h2>
        <Elsewhere entry={entry} parameters={parameters} origin={origin} />
      </section>
      <LiveRegion text={spoken(answer)} />
    </FormProvider>
  );
}

/** What the drawing is marked with while the fields are refused. */
function refusedBecause(trouble: ReturnType<typeof useAnswers>[number]["trouble"]): string | undefined {
  if (trouble?.kind !== "input") return undefined;
  return trouble.complaints.some(({ pointer }) => pointer?.startsWith("#/dimensions"))
    ? "Drawn with other dimensions"
    : "Input refused";
}

/** What a reader hears once an answer has settled. */
function spoken({ result, stale, trouble }: ReturnType<typeof useAnswers>[number]): string {
  if (trouble?.kind === "input") return "No answer to this input.";
  if (trouble) return "No new answer for now.";
  return result && !stale ? `Resistance ${result.resistance.text}` : "";
}
