"use client";

import { useState } from "react";
import { DataTable } from "../../../_ui/data-table";
import { Select } from "../../../_ui/select";
import type { MaterialVersion } from "./material";
import { factsOf } from "./material-facts";

/** What two versions of a material say differently, member by member. */
export function VersionDifference({ versions }: { readonly versions: readonly MaterialVersion[] }) {
  const newest = versions[versions.length - 1].version;
  const [older, setOlder] = useState(String(newest - 1));
  const [newer, setNewer] = useState(String(newest));
  const choices = versions.map(({ version }) => ({ value: String(version), label: `version ${version}` }));
  const facts = (wanted: string) =>
    new Map(factsOf(versions.find(({ version }) => String(version) === wanted) ?? versions[0]));
  const [before, after] = [facts(older), facts(newer)];
  const rows = [...new Set([...before.keys(), ...after.keys()])]
    .map((title) => ({ title, before: before.get(title) ?? "", after: after.get(title) ?? "" }))
    .filter((row) => row.before !== row.after);
  return (
    <section className="mt-4">
      <h2 className="mb-1">Difference</h2>
      <div className="grid max-w-52 grid-cols-2 gap-2">
        <Select
          label="From"
          value={older}
          options={choices}
          onChange={(event) => setOlder(event.target.value)}
        />
        <Select
          label="To"
          value={newer}
          options={choices}
          onChange={(event) => setNewer(event.target.value)}
        />
      </div>
      <DataTable
        caption={`Difference of version ${older} and version ${newer}`}
        rows={rows}
        rowKey={({ title }) => title}
        empty="These two say the same."
        columns={[
          { key: "title", title: "What", cell: ({ title }) => title },
          { key: "before", title: `Version ${older}`, cell: (row) => row.before || "–" },
          { key: "after", title: `Version ${newer}`, cell: (row) => row.after || "–" },
        ]}
      />
    </section>
  );
}
