"use client";

import dynamic from "next/dynamic";
import { type CSSProperties, useCallback, useEffect, useMemo, useRef, useState } from "react";
import { Button } from "../../_ui/button";
import { ShapeDrawing } from "../../_ui/drawing/shape-drawing";
import { QuantitySymbol } from "../../_ui/quantity-symbol";
import { filled } from "../_words/words";
import { FrameAnswerPane } from "./answer-pane";
import { FrameApi, type Trouble, type Values } from "./frame-api";
import { localDrawing } from "./local-drawing";
import { InputField } from "./input-field";
import { ToleranceField } from "./tolerance-field";
import { TroubleCard } from "./trouble-card";
import { useAnswer, useDrawing } from "./use-answer";
import { useHost } from "./use-host";
import type { FrameView, OpenTolerance } from "./frame-view";

const FrameBudget = dynamic(() => import("./frame-budget").then(({ FrameBudget: Budget }) => Budget), {
  ssr: false,
});
const FramePlots = dynamic(() => import("./frame-plots").then(({ FramePlots: Plots }) => Plots), {
  ssr: false,
});

const PlanView = dynamic(() => import("./plan-view").then(({ PlanView: View }) => View));
const FramePicture = dynamic(() => import("./frame-picture").then(({ FramePicture: Picture }) => Picture), {
  ssr: false,
});

/** One widget: inputs, drawing, answer, cautions, and whose service it is. Complete by keyboard, from 320 px. */
export function Frame({ view }: { readonly view: FrameView }) {
  const { words, locale, show } = view;
  const [values, setValues] = useState<Values>(view.start);
  const [focused, setFocused] = useState<string>();
  const [api] = useState(() => new FrameApi(view));
  const { result, trouble, pending, closing, path, ask } = useAnswer(api, values, view.outline !== null);
  const drawn = useDrawing(api, values, view.drawing);
  const drawing = useMemo(() => drawn && localDrawing(drawn, view), [drawn, view]);
  const content = useRef<HTMLElement>(null);

  const { tolerances } = view;
  /** What visitors may change, with what it starts as. */
  const defaults = useMemo(
    () =>
      Object.fromEntries([...view.open, ...(tolerances?.open ?? [])].map(({ name, value }) => [name, value])),
    [view.open, tolerances],
  );
  const put = (name: string, text: string) => setValues((before) => ({ ...before, [name]: text }));
  const onSet = useCallback(
    (given: Values) => {
      const own = Object.entries(given).filter(([name]) => Object.hasOwn(defaults, name));
      if (own.length > 0) setValues((before) => ({ ...before, ...Object.fromEntries(own) }));
    },
    [defaults],
  );
  const tell = useHost({ embed: view.embed, hosts: view.hosts, content, onSet, onCompute: ask });
  useEffect(() => {
    const inputs = Object.entries(defaults).map(([name, value]) => ({ name, value }));
    tell("ready", { title: view.title, inputs });
  }, [tell, view, defaults]);
  useEffect(() => {
    tell("values", { values });
  }, [tell, values]);
  useEffect(() => {
    if (result && !pending && !trouble) tell("result", result);
  }, [tell, result, pending, trouble]);
  useEffect(() => {
    if (!trouble) return;
    const errors = trouble.kind === "fields" ? trouble.fields : {};
    tell("error", { code: trouble.kind, message: messageOf(trouble), errors });
  }, [tell, trouble]);

  const gap = view.density === "compact" ? "gap-x-2 gap-y-0.5" : "gap-x-3 gap-y-1";
  const accent = view.accent ?? "var(--copper)";
  const style: CSSProperties & Record<"--accent", string> = { "--accent": accent };
  const errors = trouble?.kind === "fields" ? trouble.fields : {};
  const changed = Object.entries(defaults).some(([name, value]) => values[name] !== value);
  const toleranceOf = (tolerance: OpenTolerance) => (
    <ToleranceField
      key={tolerance.name}
      tolerance={tolerance}
      about={values[tolerance.input] ?? tolerance.about}
      value={values[tolerance.name] ?? ""}
      error={errors[tolerance.name]}
      words={words}
      locale={locale}
      onChange={(text) => put(tolerance.name, text)}
    />
  );
  return (
    <main
      ref={content}
      style={style}
      className={`mx-auto max-w-[720px] border-t-3 border-t-(--accent) bg-sheet ${view.density === "compact" ? "p-1.5" : "p-2"}`}
    >
      <h1 className="text-h3!">{view.title}</h1>
      {view.intro ? <p className="mt-0.5 text-table text-ink-soft">{view.intro}</p> : null}
      {view.preview ? <p className="mt-0.5 text-small text-amber">{words.preview}</p> : null}
      <noscript>
        <p className="mt-1 border-s-3 border-s-amber ps-1.5 text-table">{words.noScript}</p>
      </noscript>
      <div className="mt-1.5 grid gap-x-3 gap-y-1.5 min-[600px]:grid-cols-[minmax(0,17rem)_minmax(0,1fr)]">
        <form aria-label={words.inputs} onSubmit={(event) => event.preventDefault()}>
          <div className={`grid ${gap} min-[400px]:max-[600px]:grid-cols-2`}>
            {view.open.map((input) => (
              <div key={input.name}>
                <InputField
                  input={input}
                  value={values[input.name] ?? ""}
                  error={errors[input.name]}
                  words={words}
                  locale={locale}
                  onChange={(text) => put(input.name, text)}
                  onFocusChange={(on) => setFocused(on ? input.line : undefined)}
                />
                {tolerances?.open.filter((own) => own.input === input.name).map(toleranceOf)}
              </div>
            ))}
            {tolerances?.open
              .filter((own) => !view.open.some(({ name }) => name === own.input))
              .map(toleranceOf)}
          </div>
          {view.fixed.length > 0 ? (
            <dl className="grid grid-cols-[auto_1fr] gap-x-2 text-table" aria-label={words.fixed}>
              {view.fixed.map(({ name, label, symbol, text }) => (
                <div key={name} className="contents">
                  <dt className="text-ink-soft">
                    {label} {symbol ? <QuantitySymbol text={symbol} /> : null}
                  </dt>
                  <dd className="font-mono">{text}</dd>
                </div>
              ))}
            </dl>
          ) : null}
          {changed ? (
            <Button variant="quiet" className="mt-0.5 -ms-2 print:hidden" onClick={() => setValues(defaults)}>
              {words.reset}
            </Button>
          ) : null}
        </form>
        <div className="grid content-start gap-1.5">
          <FrameAnswerPane
            view={view}
            result={result}
            stale={pending || trouble !== null}
            closing={closing}
          />
          {trouble ? <TroubleCard view={view} trouble={trouble} values={values} onAgain={ask} /> : null}
          {drawing ? <ShapeDrawing {...drawing} focused={focused} words={words} /> : null}
          {view.outline?.plan ? <PlanView view={view} plan={view.outline.plan} /> : null}
        </div>
      </div>
      {tolerances?.budget && result?.uncertainty ? (
        <FrameBudget view={view} tolerances={tolerances} result={result} />
      ) : null}
      {show.plots && result?.profile ? <FramePlots view={view} profile={result.profile} /> : null}
      {show.plots && path !== null ? <FramePicture key={path} view={view} api={api} path={path} /> : null}
      <footer className="mt-2 border-t border-rule pt-1 text-small text-ink-soft">
        <p>{words.disclaimer}</p>
        <p>
          <a href={view.service} target="_blank" rel="noopener" className="link">
            {filled(words.service, view.owner)}
          </a>
        </p>
      </footer>
    </main>
  );
}

function messageOf(trouble: Trouble): string {
  if (trouble.kind === "failed") return trouble.detail;
  return trouble.kind === "fields" ? [...Object.values(trouble.fields), ...trouble.whole].join(" ") : "";
}
