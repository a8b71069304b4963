import type { Metadata } from "next";
import { Breadcrumb } from "../../../_ui/breadcrumb";
import { ScrollFrame } from "../../../_ui/scroll-frame";
import { againstOf, ROWS, titleOf } from "./compared";
import { neighbours } from "../_content/pages";
import { Deviation } from "../_parts/deviation";
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
        const rows = ROWS.filter(({ file }) => file.startsWith(prefix));
        return rows.length === 0 ? null : (
          <section key={prefix} className="mt-4">
            <h2>{title}</h2>
            <ScrollFrame label={title} className="mt-1 max-w-[56rem] print:overflow-visible">
              <table className="w-full border-collapse text-table">
                <thead>
                  <tr className="border-b border-edge">
                    <th scope="col" className="px-1 py-1 text-start font-semibold">
                      Compared
                    </th>
                    <th scope="col" className="px-1 py-1 text-start font-semibold">
                      With
                    </th>
                    <th scope="col" className="px-1 py-1 text-end font-semibold">
                      Comparisons
                    </th>
                    <th scope="col" className="px-1 py-1 text-end font-semibold">
                      Worst relative deviation
                    </th>
                  </tr>
                </thead>
                <tbody>
                  {rows.map(({ file, group, cases, worst }) => (
                    <tr key={`${file} ${group}`} className="border-b border-rule">
                      <td className="px-1 py-1">{titleOf(group)}</td>
                      <td className="px-1 py-1">{againstOf(file)}</td>
                      <td className="px-1 py-1 text-end font-mono">{cases}</td>
                      <td className="px-1 py-1 text-end font-mono">
                        <Deviation value={worst} />
                      </td>
                    </tr>
                  ))}
                </tbody>
              </table>
            </ScrollFrame>
          </section>
        );
      })}
      <PageLinks {...neighbours("/docs/accuracy")} />
    </>
  );
}
