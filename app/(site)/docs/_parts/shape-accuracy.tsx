import type { ResistanceResult } from "@/lib/engine";
import { SiteLink } from "../../../_ui/site/site-link";
import { BASES } from "../_content/bounds";
import { comparisonsOf } from "../accuracy/compared";
import { Deviation } from "./deviation";
import { Inline } from "./inline";
import { ScrollTable, TableHead } from "./scroll-table";

/** What a shape's bounds promise, what its example's own checks found, and how far the tests found it off. */
export function ShapeAccuracy({ result }: { readonly result: ResistanceResult }) {
  const { boundsBasis, proved } = result.resistance;
  const basis = BASES.find(([name]) => name === boundsBasis);
  const route = result.checks?.find(({ name }) => name === "second-route");
  const compared = comparisonsOf(result.shape);
  return (
    <>
      <p>
        <strong>Promised.</strong> The bounds of the example have the basis{" "}
        <SiteLink href="/docs/bounds#bases" className="link">
          <code>{boundsBasis}</code>
        </SiteLink>
        {basis ? (
          <>
            : <Inline text={basis[1]} />
          </>
        ) : null}
        . They are {proved ? "proved" : "not proved"}; every answer says so of its own.
      </p>
      <p>
        <strong>Checked in each answer.</strong>{" "}
        {route?.applies && route.deviation !== undefined && route.tolerance !== undefined ? (
          <>
            A second route leads to the same number; in the example they differ by{" "}
            <Deviation value={route.deviation} />, and an answer that differs by more than{" "}
            <Deviation value={route.tolerance} /> is not given out.
          </>
        ) : (
          <>There is no second route for the example: {route?.reason ?? "none is stated."}</>
        )}
      </p>
      {compared.length > 0 ? (
        <>
          <p>
            <strong>Measured.</strong> In the tests, against numbers from outside the engine; the largest
            relative deviation of this shape, rounded up:
          </p>
          <ScrollTable label="Comparisons in the tests">
            <TableHead columns={["group of tests", "compared with", "comparisons", "largest deviation"]} />
            <tbody>
              {compared.map(({ group, against, cases, worst }) => (
                <tr key={`${group} ${against}`}>
                  <td className="min-w-16">{group}</td>
                  <td className="min-w-16">{against}</td>
                  <td>{cases.toLocaleString("en")}</td>
                  <td className="whitespace-nowrap">
                    <Deviation value={worst} />
                  </td>
                </tr>
              ))}
            </tbody>
          </ScrollTable>
          <p>
            A test fails if the engine becomes worse than that; all groups are under{" "}
            <SiteLink href="/docs/accuracy" className="link">
              accuracy
            </SiteLink>
            .
          </p>
        </>
      ) : (
        <p>
          <strong>Measured.</strong> No number from outside the engine stands beside this shape in the
          accuracy table. Its tests are those of <SiteLink href="/docs/methods#tests">every shape</SiteLink>:
          limits, scaling, random dimensions, and the checks of each answer.
        </p>
      )}
    </>
  );
}
