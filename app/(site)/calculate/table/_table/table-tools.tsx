"use client";

import { useState } from "react";
import { Button } from "../../../../_ui/button";
import { FileButton } from "../../../../_ui/file-button";
import { Segmented } from "../../../../_ui/segmented";
import { Select } from "../../../../_ui/select";
import type { ShapeChoice } from "../_model/vocabulary";

interface TableToolsProps {
  readonly shapes: readonly ShapeChoice[];
  readonly first: string;
  readonly decimalComma: boolean;
  readonly onExample: (shape: string) => void;
  readonly onFile: (file: File) => void;
  readonly onDecimalComma: (comma: boolean) => void;
}

/** Where rows come from, and how their numbers are written. */
export function TableTools(props: TableToolsProps) {
  const { shapes, first, decimalComma, onExample, onFile, onDecimalComma } = props;
  const [chosen, setChosen] = useState(first);
  return (
    <div className="mt-3 flex flex-wrap items-end gap-x-2 gap-y-1">
      <Select
        label="Start with the columns of"
        value={chosen}
        options={shapes.map(({ id, title }) => ({ value: id, label: title }))}
        onChange={(event) => setChosen(event.target.value)}
        className="w-full narrow:w-32"
      />
      <div className="flex flex-wrap gap-1 pb-3.75">
        <Button onClick={() => onExample(chosen)}>Use them</Button>
        <a
          href={`/calculate/table/template?shape=${chosen}`}
          download
          className="inline-flex min-h-5.5 items-center rounded px-1 text-table link medium:min-h-5"
        >
          CSV template
        </a>
        <FileButton label="Upload CSV" accept=".csv,.tsv,.txt,text/csv" onFile={onFile} />
      </div>
      <Segmented
        label="Numbers are written"
        value={decimalComma ? "comma" : "point"}
        options={[
          { value: "point", label: "0.5" },
          { value: "comma", label: "0,5" },
        ]}
        onChange={(value) => onDecimalComma(value === "comma")}
        className="pb-3.75"
      />
    </div>
  );
}
