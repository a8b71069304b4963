"use client";

import { LENGTH_UNITS_M, type LengthUnit } from "@/lib/engine/field/outline/length-units";
import { Segmented } from "../../../_ui/segmented";
import { Toggle } from "../../../_ui/toggle";
import { rescale } from "../_model/edit";
import { mediumKindOf, switchMedium } from "../_model/medium";
import type { Sketch } from "../_model/sketch";
import type { DrawTarget, Tool } from "./board/tools";
import { NumberCell } from "./number-cell";
import { useOutline } from "./outline-context";

/** Units that the menu offers; the others of the API come with a file. */
const OFFERED: readonly LengthUnit[] = ["nm", "um", "mm", "cm", "m", "km", "mil", "in", "ft"];

interface BoardToolsProps {
  readonly tool: Tool;
  readonly setTool: (tool: Tool) => void;
  readonly drawTarget: DrawTarget;
  readonly setDrawTarget: (target: DrawTarget) => void;
  /** Whether there is a field to read off. */
  readonly readable: boolean;
}

/** What the pointer does, and the grid. */
export function BoardTools({ tool, setTool, drawTarget, setDrawTarget, readable }: BoardToolsProps) {
  const { sketch, edit, grid, setGrid } = useOutline();
  const empty = sketch.rings[0].length === 0;
  const units = [...new Set([...OFFERED, sketch.unit])];

  function changeUnit(unit: LengthUnit) {
    const ratio = LENGTH_UNITS_M[sketch.unit] / LENGTH_UNITS_M[unit];
    edit((sketch) => ({ ...rescale(sketch, ratio), unit }));
    setGrid({ ...grid, step: Number((grid.step * ratio).toPrecision(12)) });
  }

  return (
    <div className="grid gap-1 print:hidden">
      {/* A row of its own, so that the board stays where it is when the tool changes. */}
      <div className="flex flex-wrap gap-x-2 gap-y-1">
        <Segmented
          label="Tool"
          labelShown={false}
          value={tool}
          options={[
            { value: "shape", label: "Shape" },
            { value: "draw", label: "Draw" },
            { value: "terminal", label: "Terminals" },
            ...(readable ? [{ value: "read" as const, label: "Read off" }] : []),
          ]}
          onChange={setTool}
        />
        {tool === "draw" ? (
          <Segmented
            label="What is drawn"
            labelShown={false}
            value={empty ? "outer" : drawTarget}
            options={
              empty
                ? [{ value: "outer", label: "Outer ring" }]
                : [
                    { value: "hole", label: "Hole" },
                    { value: "region", label: "Region" },
                    { value: "outer", label: "New outer ring" },
                  ]
            }
            onChange={setDrawTarget}
          />
        ) : null}
      </div>
      <div className="flex flex-wrap items-center gap-x-1.5 gap-y-0.5 text-table">
        <label className="flex items-center gap-0.5">
          Unit
          <select
            value={sketch.unit}
            onChange={(event) => changeUnit(event.target.value as LengthUnit)}
            className="min-h-5.5 rounded border border-edge bg-sheet ps-0.5 font-mono hover:border-ink medium:min-h-4.5"
          >
            {units.map((unit) => (
              <option key={unit} value={unit}>
                {unit === "um" ? "µm" : unit}
              </option>
            ))}
          </select>
        </label>
        <span className="flex items-center gap-0.5">
          Grid
          <NumberCell
            label="Grid step"
            value={grid.step}
            unit={sketch.unit}
            refuse={(step) => (step > 0 ? null : "The step is greater than 0.")}
            onCommit={(step) => setGrid({ ...grid, step })}
            className="w-7"
            inputClass="medium:min-h-4.5"
          />
        </span>
        <Toggle label="Snap" checked={grid.snap} onChange={(snap) => setGrid({ ...grid, snap })} />
        <Toggle
          label="Axisymmetric"
          checked={sketch.symmetry === "axisymmetric"}
          onChange={(on) => edit((sketch) => withSymmetry(sketch, on))}
        />
      </div>
    </div>
  );
}

/** A solid of revolution has no sheet resistance; its medium starts from a conductivity then. */
function withSymmetry(sketch: Sketch, axisymmetric: boolean): Sketch {
  const medium =
    axisymmetric && mediumKindOf(sketch.medium) === "sheetResistance"
      ? switchMedium(sketch.medium, "conductivity", undefined, true)
      : axisymmetric || mediumKindOf(sketch.medium) === "sheetResistance"
        ? sketch.medium
        : { ...sketch.medium, thickness: sketch.medium.thickness ?? "35 um" };
  return { ...sketch, symmetry: axisymmetric ? "axisymmetric" : "plan", medium };
}
