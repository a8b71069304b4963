"use client";

import { type ReactNode, useMemo, useState } from "react";
import { Braces, Plus, RotateCcw } from "lucide-react";
import { Button } from "../../../_ui/button";
import { LiveRegion } from "../../../_ui/live-region";
import { Notice } from "../../../_ui/notice";
import { ProblemNotice } from "../../../_ui/problem-notice";
import { ToastArea, useToast } from "../../../_ui/toast";
import { JsonDialog } from "../../_live/json-dialog";
import { SaveRecord, type Saving } from "../../calculate/_calculator/save-record";
import { elementAt } from "../_model/complaints";
import { type Element, freeName, type Network, newElement, nodeNames, START } from "../_model/network";
import { readBodyText } from "../_model/read-body";
import { NetworkBudget } from "./budget";
import { ConditionFields } from "./condition-fields";
import { MOST_DRAWN, NetworkDrawing } from "./drawing";
import { ElementTable } from "./element-table";
import { Elsewhere } from "./elsewhere";
import { NetworkHeadline, Statements } from "./outcome";
import { useNetwork } from "./use-network";
import { type FirstSolution, useSolution } from "./use-solution";

interface NetworkPageProps {
  readonly heading: ReactNode;
  /** Shapes with the address of their example. */
  readonly shapes: readonly { readonly id: string; readonly title: string }[];
  readonly first: FirstSolution;
  readonly origin: string;
  /** How the reader may keep a calculation; left out where nobody can. */
  readonly saving?: Saving;
}

const PAGE_ROWS = 100;

/** Elements between nodes, by table and drawing, with what passes through them. */
export function NetworkPage(props: NetworkPageProps) {
  return (
    <ToastArea>
      <LiveNetwork {...props} />
    </ToastArea>
  );
}

function LiveNetwork({ heading, shapes, first, origin, saving }: NetworkPageProps) {
  const [network, edit] = useNetwork();
  const solution = useSolution(network, first);
  const { body, result, answers, stale, problem, complaints, portComplaints, requests } = solution;
  const [focused, setFocused] = useState<number | null>(null);
  const [page, setPage] = useState(0);
  const [shape, setShape] = useState("bar");
  const [json, setJson] = useState(false);
  const toast = useToast();
  const { elements } = network;
  const names = useMemo(() => nodeNames(network), [network]);
  const pages = Math.max(1, Math.ceil(elements.length / PAGE_ROWS));
  const at = Math.min(page, pages - 1);
  const shown = elements.map((_, k) => k).slice(at * PAGE_ROWS, (at + 1) * PAGE_ROWS);

  function change(id: number, part: Partial<Element>, whole: Partial<Network> = {}) {
    edit((now) => ({
      ...now,
      ...whole,
      elements: now.elements.map((element) => (element.id === id ? { ...element, ...part } : element)),
    }));
  }

  function add(value: Element["value"], called?: string) {
    const [from, to] = [elements.at(-1)?.from ?? network.ports[0], elements.at(-1)?.to ?? network.ports[1]];
    const name = called && !elements.some((element) => element.name === called) ? called : freeName(network);
    edit((now) => ({ ...now, elements: [...now.elements, newElement({ name, from, to, value })] }));
    setPage(Math.floor(elements.length / PAGE_ROWS));
  }

  function remove(id: number) {
    const before = network;
    edit((now) => ({ ...now, elements: now.elements.filter((element) => element.id !== id) }));
    toast("The element is gone.", { undo: () => edit(() => before), about: "network" });
  }

  function replace(next: Network, said: string) {
    const before = network;
    edit(() => next);
    setPage(0);
    setJson(false);
    toast(said, { undo: () => edit(() => before), about: "network" });
  }

  function take(text: string) {
    const reading = readBodyText(text);
    if (!reading.ok) return reading.complaints;
    const count = reading.network.elements.length.toLocaleString("en");
    replace(reading.network, `A network of ${count} elements stands here.`);
    return [];
  }

  return (
    <>
      <div className="flex flex-wrap items-end gap-x-3 gap-y-1">
        <div className="min-w-0 grow basis-[28rem]">{heading}</div>
        <div className="flex flex-wrap items-center gap-0.5 print:hidden">
          <Button variant="quiet" onClick={() => setJson(true)}>
            <Braces aria-hidden size={16} /> JSON
          </Button>
          <Button variant="quiet" onClick={() => replace(START, "The example stands again.")}>
            <RotateCcw aria-hidden size={16} /> Start over
          </Button>
          {saving && body ? (
            <SaveRecord
              saving={saving}
              path="/networks"
              body={body}
              title={`${network.ports[0]} to ${network.ports[1]}`}
              placeOf={({ pointer = "" }) =>
                elementAt(
                  pointer,
                  elements.map(({ name }) => name),
                )
              }
            />
          ) : null}
        </div>
      </div>
      <div className="mt-2 grid items-start gap-x-5 gap-y-2 wide:grid-cols-[24rem_minmax(0,1fr)]">
        <ConditionFields
          network={network}
          names={names}
          complaints={portComplaints}
          uncertaintyComplaint={solution.uncertaintyComplaint}
          requirementComplaints={solution.requirementComplaints}
          onChange={edit}
        />
        <NetworkHeadline result={result} stale={stale} />
      </div>
      {solution.pause ? (
        <div className="mt-1">
          <Notice tone="caution" title={solution.pause.title}>
            <p>{solution.pause.detail}</p>
          </Notice>
        </div>
      ) : null}
      {problem ? (
        <div className="mt-1">
          <ProblemNotice problem={problem} />
        </div>
      ) : null}
      <div className="mt-2">
        {elements.length === 0 ? null : elements.length <= MOST_DRAWN ? (
          <NetworkDrawing
            network={network}
            result={result}
            answers={answers}
            stale={stale}
            focused={focused}
            onPick={(id) => {
              setPage(Math.floor(elements.findIndex((element) => element.id === id) / PAGE_ROWS));
              requestAnimationFrame(() => document.getElementById(`element-${id}`)?.focus());
            }}
          />
        ) : (
          <Notice title="No drawing">
            {elements.length.toLocaleString("en")} elements are more than a drawing can show ({MOST_DRAWN}).
            The table has them all.
          </Notice>
        )}
      </div>
      <h2 className="mt-3 mb-1">Elements</h2>
      <datalist id="nodes">
        {names.map((name) => (
          <option key={name} value={name} />
        ))}
      </datalist>
      <ElementTable
        network={network}
        shown={shown}
        answers={answers}
        stale={stale}
        complaints={complaints}
        requests={requests}
        onChange={change}
        onRemove={remove}
        onFocus={setFocused}
      />
      <div className="mt-1 flex flex-wrap items-center gap-1">
        <Button onClick={() => add({ kind: "resistance", text: "1 mohm" })}>
          <Plus aria-hidden size={16} /> Add a resistance
        </Button>
        <span className="flex items-center gap-0.5">
          <select
            aria-label="Shape of the next element"
            value={shape}
            onChange={(event) => setShape(event.target.value)}
            className="min-h-5.5 w-20 min-w-0 rounded border border-edge bg-sheet px-0.5 text-table hover:border-ink medium:min-h-5"
          >
            {shapes.map(({ id, title }) => (
              <option key={id} value={id}>
                {title}
              </option>
            ))}
          </select>
          <Button
            className="whitespace-nowrap"
            onClick={() =>
              add({ kind: "shape", address: shape }, shapes.find(({ id }) => id === shape)?.title)
            }
          >
            <Plus aria-hidden size={16} /> Add this shape
          </Button>
        </span>
        {pages > 1 ? (
          <span className="flex items-center gap-1 text-table">
            <Button variant="quiet" disabled={at === 0} onClick={() => setPage(at - 1)}>
              Before
            </Button>
            Page {at + 1} of {pages}
            <Button variant="quiet" disabled={at === pages - 1} onClick={() => setPage(at + 1)}>
              Next
            </Button>
          </span>
        ) : null}
      </div>
      <p className="mt-1 max-w-prose text-table text-ink-soft">
        A shape starts with its example. Open it in a new tab, change it there, and paste the link of that
        page here in its place. A call’s body as JSON can stand there as well.
      </p>
      {json ? (
        <JsonDialog
          title="Network as JSON"
          description="The body of POST /networks."
          body={body}
          fileName="network.json"
          mostMB={20}
          take={take}
          onClose={() => setJson(false)}
        />
      ) : null}
      {result?.uncertainty ? (
        <section aria-labelledby="budget" className={`mt-3 ${stale ? "opacity-60" : ""}`}>
          <h2 id="budget" className="mb-1">
            Tolerance budget
          </h2>
          <NetworkBudget uncertainty={result.uncertainty} materials={result.materials} />
        </section>
      ) : null}
      {result ? <Statements result={result} stale={stale} /> : null}
      {body ? (
        <section aria-labelledby="elsewhere" className="mt-5 print:hidden">
          <h2 id="elsewhere" className="mb-1">
            Use this elsewhere
          </h2>
          <Elsewhere origin={origin} body={body} />
        </section>
      ) : null}
      <LiveRegion text={result && !stale ? `Resistance ${result.resistance.text}` : ""} />
    </>
  );
}
