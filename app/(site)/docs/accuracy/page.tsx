import type { Metadata } from "next";
import { Breadcrumb } from "../../../_ui/breadcrumb";
import table from "./table.json";
import { neighbours } from "../_content/pages";
import { PageLinks } from "../_parts/page-links";

export const metadata: Metadata = { title: "Accuracy" };

/** What the groups are about, by the folder or file their tests lie in. */
const PARTS: readonly (readonly [prefix: string, title: string])[] = [
  ["tests/reference/", "Against reference values and published tables"],
  ["tests/engine/shape/axial", "Axial shapes"],
  ["tests/engine/shape/radial", "Radial and circumferential shapes"],
  ["tests/engine/shape/spreading", "Spreading and leakage"],
  ["tests/engine/shape/sheet", "Sheet patterns"],
  ["tests/engine/shape/earthing", "Earthing"],
];

export default function Accuracy() {
  return (
    <>
      <Breadcrumb trail={[{ href: "/docs", label: "Docs" }]} />
      <h1>Accuracy</h1>
      <p className="mt-2 max-w-prose">
        Every row is a group of tests that compares the engine with something outside of it: numbers of 40
        digits and more, a second method, a published value. The worst relative deviation of the group is
        written here by a script from the tests&rsquo; own results, and a test fails if the engine becomes
        worse than its row. A group against a printed table shows the rounding of the print.
      </p>
      {PARTS.map(([prefix, title]) => {
        const rows = table.filter(({ file }) => file.startsWith(prefix));
        return rows.length === 0 ? null : (
          <section key={prefix} className="mt-4">
            <h2>{title}</h2>
            <div className="mt-1 overflow-x-auto">
              <table className="w-full max-w-prose border-collapse text-table">
                <thead>
                  <tr className="border-b border-edge">
                    <th scope="col" className="py-1 pe-3 text-start font-semibold">
                      Compared
                    </th>
                    <th scope="col" className="py-1 pe-3 text-end font-semibold">
                      Comparisons
                    </th>
                    <th scope="col" className="py-1 text-end font-semibold">
                      Worst relative deviation
                    </th>
                  </tr>
                </thead>
                <tbody>
                  {rows.map(({ file, group, cases, worst }) => (
                    <tr key={`${file} ${group}`} className="border-b border-rule">
                      <td className="py-1 pe-3">{group}</td>
                      <td className="py-1 pe-3 text-end font-mono">{cases}</td>
                      <td className="py-1 text-end font-mono">{shown(worst)}</td>
                    </tr>
                  ))}
                </tbody>
              </table>
            </div>
          </section>
        );
      })}
      <PageLinks {...neighbours("/docs/accuracy")} />
    </>
  );
}

/** A deviation with its exponent typeset. */
function shown(worst: number) {
  if (worst === 0) return "0";
  const [mantissa, exponent] = worst.toExponential(1).split("e");
  return (
    <>
      {mantissa}&#8239;·&#8239;10<sup>{exponent.replace("-", "−").replace("+", "")}</sup>
    </>
  );
}
