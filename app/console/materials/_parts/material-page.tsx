"use client";

import Link from "next/link";
import { useState } from "react";
import { Button } from "../../../_ui/button";
import { Notice } from "../../../_ui/notice";
import { LocalTime } from "../../../_ui/local-time";
import { PlotFigure } from "../../../_ui/plot/plot-figure";
import { ProblemNotice } from "../../../_ui/problem-notice";
import { Loading } from "../../../_ui/states";
import { useToast } from "../../../_ui/toast";
import { countText } from "../../_parts/numbers";
import { PageHead } from "../../_parts/page-head";
import { useConsole } from "../../_shell/use-console";
import type { MaterialHistory, MaterialVersion } from "./material";
import { MaterialDialog } from "./material-dialog";
import { factsOf } from "./material-facts";
import { RetireDialog } from "./retire-dialog";
import { VersionDifference } from "./version-difference";

/** One material: its law, its versions, the records that used each. */
export function MaterialPage({ id, name }: { readonly id: string; readonly name: string }) {
  const { data, error, mutate } = useConsole<MaterialHistory>(`materials/${id}`);
  const [open, setOpen] = useState<"change" | "retire" | null>(null);
  const toast = useToast();
  const current = data?.versions.at(-1);
  const close = () => setOpen(null);

  function done(message: string) {
    close();
    void mutate();
    toast(message);
  }

  const changeable = data?.mayManage === true && current?.retiredAt === null;
  return (
    <>
      <PageHead
        title={current?.name ?? name}
        actions={
          changeable ? (
            <>
              <Button onClick={() => setOpen("change")}>Make the next version</Button>
              <Button variant="danger" onClick={() => setOpen("retire")}>
                Retire
              </Button>
            </>
          ) : null
        }
      >
        <span className="font-mono">{id}</span>
        {data ? ` · ${data.teamName ?? "library"}` : null}
      </PageHead>
      {error ? <ProblemNotice problem={error.problem} /> : null}
      {data && current ? (
        <Facts history={data} current={current} />
      ) : error ? null : (
        <Loading what="the material" className="h-50" />
      )}
      {data && current && open === "change" ? (
        <MaterialDialog
          id={id}
          current={current}
          onClose={close}
          onSaved={() => done("The next version is stored; requests use it from now on.")}
        />
      ) : null}
      {data && current && open === "retire" ? (
        <RetireDialog
          history={data}
          current={current}
          onClose={close}
          onRetired={() => done("The material is retired.")}
        />
      ) : null}
    </>
  );
}

interface FactsProps {
  readonly history: MaterialHistory;
  readonly current: MaterialVersion;
}

function Facts({ history, current }: FactsProps) {
  const { versions, uses, id } = history;
  const records = new Map(uses.map((use) => [use.version, use.records]));
  return (
    <>
      {current.retiredAt ? (
        <div className="mb-2">
          <Notice tone="caution" title="Retired">
            Since <LocalTime at={current.retiredAt} />. New requests that name it are refused; records keep
            what they used.
          </Notice>
        </div>
      ) : null}
      <dl className="grid gap-x-3 text-table max-medium:[&_dt:not(:first-child)]:mt-1 medium:grid-cols-[auto_1fr] medium:gap-y-0.5 [&_dt]:text-ink-soft">
        {factsOf(current)
          .filter(([, value]) => value !== "")
          .map(([title, value]) => (
            <div key={title} className="contents">
              <dt>{title}</dt>
              <dd className="[overflow-wrap:anywhere]">{value}</dd>
            </div>
          ))}
      </dl>
      {current.curve.temperaturesC.length > 1 ? (
        <div className="mt-3">
          <PlotFigure
            title="Resistivity against temperature"
            fileName={id}
            x={{ label: "Temperature", unit: "°C", values: current.curve.temperaturesC }}
            y={{ label: "Resistivity", unit: "Ω·m" }}
            series={[{ label: "resistivity", values: current.curve.resistivityOhmM }]}
          />
        </div>
      ) : null}
      <h2 className="mt-4 mb-1">Versions</h2>
      <ul className="divide-y divide-rule rounded border border-rule bg-sheet text-table">
        {[...versions].reverse().map((version) => (
          <li key={version.version} className="flex flex-wrap items-baseline gap-x-2 px-1.5 py-0.5">
            <span className="font-medium">Version {version.version}</span>
            <span className="grow text-ink-soft">
              {version.madeAt ? (
                <>
                  <LocalTime at={version.madeAt} /> by {version.madeBy}
                </>
              ) : (
                "with this installation"
              )}
            </span>
            <span>
              used by {countText(records.get(version.version) ?? 0)} record
              {records.get(version.version) === 1 ? "" : "s"}
            </span>
          </li>
        ))}
      </ul>
      {uses.length > 0 ? (
        <p className="mt-1 text-table">
          <Link className="link" href={`/console/records?material=${id}`}>
            The records that used it
          </Link>
        </p>
      ) : null}
      {versions.length > 1 ? <VersionDifference versions={versions} /> : null}
    </>
  );
}
