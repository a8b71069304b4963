"use client";

import { useState } from "react";
import { Button } from "../../../_ui/button";
import { DataTable } from "../../../_ui/data-table";
import { Dialog } from "../../../_ui/dialog";
import { CONTROL, Field } from "../../../_ui/field";
import type { MaterialChoice } from "../_server/material-choices";
import { spreadText } from "./material-words";

interface MaterialBrowserProps {
  readonly materials: readonly MaterialChoice[];
  readonly chosen: string;
  readonly onChoose: (id: string) => void;
  readonly onClose: () => void;
}

/** All materials side by side, to search, sort and choose from. */
export function MaterialBrowser({ materials, chosen, onChoose, onClose }: MaterialBrowserProps) {
  const [search, setSearch] = useState("");
  const words = search.toLowerCase().split(/\s+/).filter(Boolean);
  const shown = materials.filter(({ id, name, kind, source, owner }) => {
    const text = `${id} ${name} ${kind} ${source} ${owner}`.toLowerCase();
    return words.every((word) => text.includes(word));
  });
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="Materials"
      description="Resistivities at the operating temperature. Data of the library is nominal unless a team measured it."
      wide
    >
      <Field label="Search by name, kind or source">
        {(control) => (
          <input
            {...control}
            type="search"
            value={search}
            onChange={(event) => setSearch(event.target.value)}
            className={`${CONTROL} font-sans!`}
          />
        )}
      </Field>
      <DataTable
        caption="Materials"
        rows={shown}
        rowKey={({ id }) => id}
        maxHeight="55vh"
        empty="No material has these words."
        columns={[
          {
            key: "name",
            title: "Material",
            minWidth: "10rem",
            sortBy: ({ name }) => name,
            cell: (material) => (
              <Button
                variant={material.id === chosen ? "primary" : "plain"}
                className="w-full justify-start! text-start"
                onClick={() => onChoose(material.id)}
              >
                {material.name}
              </Button>
            ),
          },
          {
            key: "rho",
            title: "ρ",
            align: "end",
            sortBy: ({ resistivityOhmM }) => resistivityOhmM ?? Infinity,
            cell: ({ resistivityText }) => resistivityText ?? "–",
          },
          {
            key: "spread",
            title: "Spread",
            minWidth: "7rem",
            cell: ({ uncertainty }) => spreadText(uncertainty),
          },
          {
            key: "range",
            title: "Range",
            align: "end",
            cell: ({ range }) => `${range.from} … ${range.to} °C`,
          },
          { key: "owner", title: "Of", sortBy: ({ owner }) => owner, cell: ({ owner }) => owner },
          { key: "kind", title: "Kind", sortBy: ({ kind }) => kind, cell: ({ kind }) => kind },
          {
            key: "source",
            title: "Source",
            minWidth: "22rem",
            cell: ({ source, provenance, version }) => `${source} (${provenance}, version ${version})`,
          },
        ]}
      />
    </Dialog>
  );
}
