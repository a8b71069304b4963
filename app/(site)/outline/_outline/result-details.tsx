import type { ReactNode } from "react";
import { superscript } from "../../../_ui/plot/axis";
import { engineering } from "../../calculate/_calculator/answer/engineering";
import { Cautions, Checks } from "../../calculate/_calculator/answer/statements";
import type { FieldView } from "../_model/field-view";

type Result = NonNullable<FieldView["result"]>;

interface ResultDetailsProps {
  readonly result: Result;
  readonly names: readonly string[];
}

/** What stands behind the answer: peak, operating point, matrix, checks, repairs, cautions, mesh. */
export function ResultDetails({ result, names }: ResultDetailsProps) {
  const { peak, operating, mesh, seconds, repairs, cautions, assumptions, materials, engine } = result;
  return (
    <div className="grid grid-cols-1 gap-3" data-testid="details">
      <Cautions cautions={cautions} />
      <div className="grid items-start gap-x-5 gap-y-3 medium:grid-cols-2">
        {peak ? (
          <section>
            <h3 className="mb-0.5">Where the current crowds</h3>
            <p className="text-table" data-testid="peak">
              {peak.text}
            </p>
          </section>
        ) : null}
        <section>
          <h3 className="mb-0.5">Solution</h3>
          <dl className="grid grid-cols-[auto_1fr] gap-x-2 gap-y-0.25 text-table">
            <Fact title="Temperature">{operating.temperature} °C</Fact>
            {operating.voltage === undefined ? null : (
              <Fact title="Voltage">{engineering(operating.voltage, "V")}</Fact>
            )}
            {operating.current === undefined ? null : (
              <Fact title="Current">{engineering(operating.current, "A")}</Fact>
            )}
            {operating.power === undefined ? null : (
              <Fact title="Power">{engineering(operating.power, "W")}</Fact>
            )}
            <Fact title="Mesh">
              {mesh.triangles.toLocaleString("en")} triangles, {mesh.unknowns.toLocaleString("en")} unknowns,{" "}
              {mesh.refinements} refinements
            </Fact>
            <Fact title="Time">{Number(seconds.toPrecision(2))} s</Fact>
            {materials.length > 0 ? (
              <Fact title="Material">
                {materials.map(({ name, version }) => `${name}, version ${version}`).join("; ")}
              </Fact>
            ) : null}
            <Fact title="Engine">{engine}</Fact>
          </dl>
        </section>
      </div>
      {result.conductance ? <Matrix matrix={result.conductance} names={names} /> : null}
      <section>
        <h3 className="mb-0.5">Checks on this answer</h3>
        <Checks checks={result.checks} />
      </section>
      <div className="grid items-start gap-x-5 gap-y-3 medium:grid-cols-2">
        <Lines title="Repairs" lines={repairs} />
        <Lines title="Assumptions" lines={assumptions} />
      </div>
    </div>
  );
}

function Fact({ title, children }: { readonly title: string; readonly children: ReactNode }) {
  return (
    <>
      <dt className="text-ink-soft">{title}</dt>
      <dd>{children}</dd>
    </>
  );
}

function Lines({ title, lines }: { readonly title: string; readonly lines: readonly string[] }) {
  if (lines.length === 0) return null;
  return (
    <section>
      <h3 className="mb-0.5">{title}</h3>
      <ul className="grid list-disc gap-0.5 ps-2 text-table">
        {lines.map((line) => (
          <li key={line}>{line}</li>
        ))}
      </ul>
    </section>
  );
}

/** Currents into each terminal for one volt at one of them. */
function Matrix({
  matrix,
  names,
}: {
  readonly matrix: readonly (readonly number[])[];
  readonly names: readonly string[];
}) {
  return (
    <section>
      <h3 className="mb-0.5">Conductance matrix / S</h3>
      <div tabIndex={0} role="group" aria-label="Conductance matrix" className="overflow-x-auto">
        <table className="border-collapse text-table" data-testid="matrix">
          <thead className="text-small text-ink-soft">
            <tr>
              <th scope="col" className="pe-2 text-start font-normal">
                Current into
              </th>
              {names.map((name) => (
                <th key={name} scope="col" className="px-1 text-end font-normal">
                  1 V at {name}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {matrix.map((row, i) => (
              <tr key={names[i]} className="border-t border-rule">
                <th scope="row" className="pe-2 text-start font-normal">
                  {names[i]}
                </th>
                {row.map((value, j) => (
                  <td key={j} className="px-1 text-end font-mono whitespace-nowrap">
                    {scientific(value)}
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </section>
  );
}

function scientific(value: number): string {
  if (value === 0) return "0";
  const [mantissa, exponent] = value.toExponential(5).split("e");
  const power = Number(exponent);
  return `${mantissa.replace("-", "−")}${power === 0 ? "" : `·10${superscript(power)}`}`;
}
