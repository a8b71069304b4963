import type { DimensionEntry, ShapeEntry } from "@/lib/engine";
import { SiteLink } from "../../../_ui/site/site-link";
import { ScrollTable, TableHead } from "./scroll-table";

/** Every dimension as a request may give it, and which exclude each other. */
export function Dimensions({ entry }: { readonly entry: ShapeEntry }) {
  return (
    <>
      <ScrollTable label="Dimensions">
        <TableHead columns={["name", "symbol", "what it is", "bare number in"]} />
        <tbody>
          {entry.dimensions.map((dimension) => (
            <tr key={dimension.name}>
              <td>
                <code>{dimension.name}</code>
              </td>
              <td>
                <i>{dimension.symbol}</i>
              </td>
              <td className="min-w-24">
                {dimension.label}. {dimension.help} <Allowed dimension={dimension} />
              </td>
              <td className="whitespace-nowrap">{dimension.unit === "1" ? "–" : (dimension.unit ?? "–")}</td>
            </tr>
          ))}
        </tbody>
      </ScrollTable>
      {entry.alternatives.map((names) => (
        <p key={names.join(" ")}>
          Exactly one of{" "}
          {names.map((name, index) => (
            <span key={name}>
              {index === 0 ? "" : index === names.length - 1 ? " or " : ", "}
              <code>{name}</code>
            </span>
          ))}
          .
        </p>
      ))}
      {entry.constraints.length > 0 ? (
        <ul>
          {entry.constraints.map(({ text }) => (
            <li key={text}>{text}</li>
          ))}
        </ul>
      ) : null}
    </>
  );
}

function Allowed({ dimension }: { readonly dimension: DimensionEntry }) {
  const { choices, default: fallback, type, range } = dimension;
  const parts: string[] = [];
  if (choices) parts.push(`One of ${choices.map(({ value }) => value).join(", ")}.`);
  if (type === "integer" && range) parts.push(`A whole number from ${range.min} to ${range.max ?? "any"}.`);
  if (fallback !== null) parts.push(`${fallback}${suffix(dimension)} where left out.`);
  return <>{parts.join(" ")}</>;
}

function suffix({ unit }: DimensionEntry): string {
  return unit === null || unit === "1" ? "" : `\u2009${unit}`;
}

/** The coordinates, and what a medium that varies along each does. */
export function Coordinates({ entry }: { readonly entry: ShapeEntry }) {
  const { gradable } = entry.media;
  return (
    <>
      <ScrollTable label="Coordinates">
        <TableHead columns={["name", "what it is", "from", "to", "runs", "graded media"]} />
        <tbody>
          {entry.coordinates.map(({ name, label, start, end, role }) => (
            <tr key={name}>
              <td>
                <code>{name}</code>
              </td>
              <td className="min-w-16">{label}</td>
              <td>{start}</td>
              <td>{end}</td>
              <td>{role} the flow</td>
              <td>
                {!gradable.includes(name)
                  ? "not possible"
                  : role === "along"
                    ? "resistivities add up"
                    : "conductivities add up"}
              </td>
            </tr>
          ))}
        </tbody>
      </ScrollTable>
      {gradable.length > 0 ? (
        <p>
          Positions of a profile are values of the coordinate, in metres or degrees. The kinds of profiles are
          under <SiteLink href="/docs/media#graded">graded media</SiteLink>.
        </p>
      ) : (
        <p>The formula holds for a uniform medium only.</p>
      )}
    </>
  );
}
