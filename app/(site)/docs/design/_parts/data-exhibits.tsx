"use client";

import { DataTable } from "../../../../_ui/data-table";
import { PlotFigure } from "../../../../_ui/plot/plot-figure";
import { Exhibit } from "./exhibit";

const SAMPLES = 101;
/** A shell from 2 mm to 5 mm: its field falls as 1/r. */
const POSITIONS = Array.from({ length: SAMPLES }, (_, i) => 0.002 + (0.003 * i) / (SAMPLES - 1));
const FIELD = POSITIONS.map((r) => 1 / (r * Math.log(2.5)));
const UNIFORM = POSITIONS.map(() => 1 / 0.003);

const ROWS = [
  { name: "Busbar, rev C", shape: "bar", ohms: 21.55e-6 },
  { name: "Sleeve", shape: "cylindrical-shell", ohms: 145.8e9 },
  { name: "Earth rod", shape: "earth-rod", ohms: 33.4 },
];

/** Tables and plots. */
export function DataExhibits() {
  return (
    <>
      <Exhibit title="Tables" note="A press on a head sorts, another turns the order, a third takes it back.">
        <div className="grid gap-2 medium:grid-cols-2">
          <DataTable
            caption="Records"
            captionShown
            rows={ROWS}
            rowKey={({ name }) => name}
            columns={[
              { key: "name", title: "Record", sortBy: ({ name }) => name, cell: ({ name }) => name },
              { key: "shape", title: "Shape", sortBy: ({ shape }) => shape, cell: ({ shape }) => shape },
              {
                key: "ohms",
                title: "R / Ω",
                align: "end",
                sortBy: ({ ohms }) => ohms,
                cell: ({ ohms }) => String(ohms),
              },
            ]}
          />
          <DataTable
            caption="No records"
            captionShown
            rows={[]}
            rowKey={(_, index) => index}
            columns={[
              { key: "name", title: "Record", cell: () => "" },
              { key: "shape", title: "Shape", cell: () => "" },
            ]}
            empty="No records yet. Save one from a calculation."
          />
        </div>
      </Exhibit>
      <Exhibit
        title="Plots"
        note="Pointer or arrow keys read a value off; axes switch to logarithmic where the values allow it; CSV, SVG and PNG to take along."
      >
        <div className="grid gap-x-4 medium:grid-cols-2">
          <PlotFigure
            title="Field strength at 1 V"
            x={{ label: "Radius", unit: "m", values: POSITIONS }}
            y={{ label: "Field", unit: "V/m" }}
            series={[{ label: "field", values: FIELD }]}
            fileName="field"
          />
          <PlotFigure
            title="Two lines"
            x={{ label: "Radius", unit: "m", values: POSITIONS }}
            y={{ label: "Field", unit: "V/m" }}
            series={[
              { label: "shell", values: FIELD },
              { label: "plane wall", values: UNIFORM },
            ]}
            fileName="fields"
          />
        </div>
      </Exhibit>
    </>
  );
}
