"use client";

import dynamic from "next/dynamic";
import { type ReactNode, useMemo, useState } from "react";
import { SWRConfig } from "swr";
import { CodeBlock } from "../../../_ui/code-block";
import { LiveRegion } from "../../../_ui/live-region";
import { Tabs } from "../../../_ui/tabs";
import { ToastArea } from "../../../_ui/toast";
import { fieldSnippets } from "../../_live/snippets";
import { SaveRecord, type Saving } from "../../calculate/_calculator/save-record";
import type { MaterialChoice } from "../../calculate/_server/material-choices";
import { useMaterials } from "../../calculate/_calculator/use-materials";
import { type Complaint, placed, placeTitle } from "../_model/complaints";
import { boxOf } from "../_model/edges";
import { fieldBody } from "../_model/field-body";
import type { Sketch } from "../_model/sketch";
import { stepFor } from "../_model/view";
import { Board } from "./board/board";
import { HoverStore } from "./board/hover-store";
import type { DrawTarget, Readings, Tool } from "./board/tools";
import { BoardTools } from "./board-tools";
import { KeepOutline } from "./keep-outline";
import { GoalPanel } from "./goal-panel";
import { MediumPanel } from "./medium-panel";
import { type Grid, OutlineProvider, type OutlineState, type Selection } from "./outline-context";
import { PageTools } from "./page-tools";
import type { Shown } from "./picture/shown";
import { ResultDetails } from "./result-details";
import { SelectionBar } from "./selection-bar";
import { SolvePanel } from "./solve-panel";
import { TerminalPanel } from "./terminal-panel";
import { useFieldMap } from "./use-field-map";
import { useHistoryKeys } from "./use-history-keys";
import { useSketch } from "./use-sketch";
import { type Solution, useSolution } from "./use-solution";
import { VertexTable } from "./vertex-table";

const PictureLayer = dynamic(() => import("./picture/picture-layer").then((module) => module.PictureLayer), {
  ssr: false,
});
const PictureBar = dynamic(() => import("./picture/picture-bar").then((module) => module.PictureBar), {
  ssr: false,
});
const ReadPanel = dynamic(() => import("./picture/read-panel").then((module) => module.ReadPanel), {
  ssr: false,
});

interface OutlinePageProps {
  readonly heading: ReactNode;
  readonly start: Sketch;
  readonly materials: readonly MaterialChoice[];
  readonly origin: string;
  /** How the reader may keep a solution; left out for one who may not. */
  readonly saving?: Saving;
}

/** Draw an outline, name its terminals, solve the field on it and read it off. */
export function OutlinePage(props: OutlinePageProps) {
  return (
    <SWRConfig value={{ dedupingInterval: 500 }}>
      <ToastArea>
        <LiveOutline {...props} />
      </ToastArea>
    </SWRConfig>
  );
}

const NOTHING_READ: Readings = { probe: null, line: null };

function LiveOutline({ heading, start, materials, origin, saving }: OutlinePageProps) {
  const state = useSketch(start);
  const { sketch, edit, settle, generation } = state;
  const [selection, select] = useState<Selection | null>(null);
  const [terminal, setTerminal] = useState(0);
  const [grid, setGrid] = useState<Grid & { readonly generation: number }>(() => gridOf(start, 0));
  const [chosen, setTool] = useState<Tool>("shape");
  const [drawTarget, setDrawTarget] = useState<DrawTarget>("hole");
  const [shown, setShown] = useState<Shown>({ density: true, equipotentials: true, streamlines: true });
  const [readings, setReadings] = useState(NOTHING_READ);
  const [reading] = useState(() => new HoverStore());
  useHistoryKeys(state.undo, state.redo);

  // Another drawing has another size: its grid follows, and nothing of the old one stays marked.
  if (grid.generation !== generation) {
    setGrid(gridOf(sketch, generation));
    select(null);
    setTerminal(0);
    setReadings(NOTHING_READ);
    setTool(sketch.rings[0].length === 0 ? "draw" : "shape");
  }

  const body = useMemo(() => fieldBody(sketch), [sketch]);
  const text = useMemo(() => JSON.stringify(body), [body]);
  const solution = useSolution();
  const current = solution.body === text;
  const field = current && solution.phase === "over" ? solution.field : null;
  const { map, trouble: mapTrouble } = useFieldMap(field);
  const { trouble } = solution;
  const complaints = useMemo(
    () => (current && trouble?.kind === "input" ? placed(trouble.complaints) : []),
    [current, trouble],
  );
  const titleOf = (complaint: Complaint) => placeTitle(placed([complaint])[0], sketch);
  const empty = sketch.rings[0].length === 0;
  const tool: Tool = chosen === "read" && !map ? "shape" : chosen;

  const shared: OutlineState = {
    sketch,
    edit,
    settle,
    selection,
    select,
    terminal: Math.min(terminal, Math.max(0, sketch.terminals.length - 1)),
    setTerminal,
    grid,
    setGrid: (next) => setGrid({ ...next, generation }),
    complaints,
    materials: useMaterials(sketch.settings.temperature, materials),
  };

  return (
    <OutlineProvider value={shared}>
      <div className="flex flex-wrap items-end gap-x-3 gap-y-1">
        <div className="min-w-0 grow basis-[18rem]">{heading}</div>
        <div className="flex flex-wrap items-center gap-0.5 print:hidden">
          <PageTools state={state} onReplace={state.replace} />
          {saving?.kind === "signed-in" ? <KeepOutline body={body} placeOf={titleOf} /> : null}
          {saving ? (
            <SaveRecord saving={saving} path="/fields" body={body} title="Outline" placeOf={titleOf} />
          ) : null}
        </div>
      </div>
      <div className="mt-2 grid grid-cols-1 items-start gap-x-4 gap-y-3 wide:grid-cols-[minmax(0,1fr)_22rem]">
        <div className="contents min-w-0 wide:grid wide:grid-cols-1 wide:gap-3">
          <div className="grid min-w-0 grid-cols-1 gap-1">
            <BoardTools
              tool={tool}
              setTool={setTool}
              drawTarget={drawTarget}
              setDrawTarget={setDrawTarget}
              readable={map !== undefined}
            />
            <Board
              tool={tool}
              drawTarget={empty ? "outer" : drawTarget}
              onDrawn={() => setTool("shape")}
              generation={generation}
              readings={readings}
              setReadings={setReadings}
              reading={reading}
              bare={map !== undefined && shown.density}
              picture={
                map
                  ? (lens) => <PictureLayer map={map} rings={sketch.rings} lens={lens} shown={shown} />
                  : undefined
              }
            />
            {map && field ? (
              <PictureBar
                id={field.id}
                map={map}
                axisymmetric={sketch.symmetry === "axisymmetric"}
                shown={shown}
                setShown={setShown}
              />
            ) : null}
            {mapTrouble ? <p className="text-small text-amber">{mapTrouble}</p> : null}
            {tool === "shape" || tool === "terminal" ? <SelectionBar /> : null}
          </div>
          {map && field ? (
            <ReadPanel
              className="order-3 wide:order-none"
              id={field.id}
              map={map}
              readings={readings}
              setReadings={setReadings}
              hover={reading}
            />
          ) : null}
          <div className="order-5 min-w-0 wide:order-none">
            <VertexTable />
          </div>
        </div>
        <div className="contents wide:grid wide:grid-cols-1 wide:gap-3">
          <SolvePanel solution={solution} body={text} className="order-2 wide:order-none" />
          <div className="order-4 grid grid-cols-1 gap-3 wide:order-none">
            <TerminalPanel />
            <MediumPanel />
            <GoalPanel />
          </div>
        </div>
      </div>
      {field?.result ? (
        <section aria-labelledby="behind" className="mt-4 border-t border-rule pt-3">
          <h2 id="behind" className="mb-1">
            What stands behind the answer
          </h2>
          <ResultDetails result={field.result} names={sketch.terminals.map(({ name }) => name)} />
        </section>
      ) : null}
      <section aria-labelledby="elsewhere" className="mt-5 print:hidden">
        <h2 id="elsewhere" className="mb-1">
          Use this elsewhere
        </h2>
        <p className="mb-1 max-w-prose text-table text-ink-soft">
          Each of these asks for exactly this solution. Set <code>RHOFORM_KEY</code> to a key of your team
          with the scope <code>field</code>.
        </p>
        <Tabs
          label="Forms of the call"
          tabs={fieldSnippets(origin, body, sketch.terminals.length).map(({ id, label, code }) => ({
            id,
            label,
            content: <CodeBlock code={code} label={label} />,
          }))}
        />
      </section>
      <LiveRegion text={spoken(solution)} />
    </OutlineProvider>
  );
}

function gridOf(sketch: Sketch, generation: number): Grid & { readonly generation: number } {
  return { step: stepFor(boxOf(sketch.rings)), snap: true, generation };
}

/** What a reader hears once something has settled. */
function spoken({ phase, field, trouble }: Solution): string {
  if (trouble?.kind === "input") return "This cannot be solved yet.";
  if (trouble) return "No answer for now.";
  if (phase === "starting" || phase === "running") return "Solving.";
  if (!field) return "";
  const { resistance, pairs } = field.result ?? {};
  if (resistance) return `Resistance ${resistance.text}`;
  return pairs ? `${pairs.length} pairs solved.` : `The solution is ${field.status}.`;
}
