import type { Metadata } from "next";
import { notFound } from "next/navigation";
import {
  catalogue,
  computeResistance,
  exampleRequest,
  findShape,
  libraryMaterial,
  shapeEntry,
} from "@/lib/engine";
import { sharedService } from "@/lib/service/service";
import { Breadcrumb } from "../../../../_ui/breadcrumb";
import { Notice } from "../../../../_ui/notice";
import { ShapeDrawing } from "../../../../_ui/drawing/shape-drawing";
import { SiteLink } from "../../../../_ui/site/site-link";
import { Tex } from "../../../../_ui/tex";
import { FAMILY_TITLES } from "../../../calculate/_model/families";
import { readGeometry } from "../../../calculate/_server/geometry";
import { Snippets } from "../../_parts/blocks";
import { PageLinks } from "../../_parts/page-links";
import { ShapeAccuracy } from "../../_parts/shape-accuracy";
import { Coordinates, Dimensions } from "../../_parts/shape-tables";
import { WorkedExample } from "../../_parts/worked-example";
import { shapeSnippets } from "../shape-snippets";

interface Props {
  readonly params: Promise<{ readonly shape: string }>;
}

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const shape = findShape((await params).shape);
  return shape
    ? { title: `${shape.title} · Shapes`, description: shape.summary }
    : { title: "No such shape" };
}

export default async function ShapeDoc({ params }: Props) {
  const shape = findShape((await params).shape);
  if (!shape) notFound();
  const entry = shapeEntry(shape);
  const request = exampleRequest(shape);
  const result = computeResistance(
    { ...request, include: ["steps", "checks"] },
    { material: libraryMaterial },
  );
  const geometry = readGeometry(shape, shape.example.dimensions);
  const place = catalogue.indexOf(shape);
  const linkTo = (other: (typeof catalogue)[number] | undefined) =>
    other && { href: `/docs/shapes/${other.id}`, title: other.title, summary: other.summary };
  return (
    <>
      <Breadcrumb
        trail={[
          { href: "/docs", label: "Docs" },
          { href: "/docs/shapes", label: "Shapes" },
        ]}
      />
      <article className="prose">
        <h1>{entry.title}</h1>
        <p className="text-table text-ink-soft">
          <code>{entry.id}</code> · {FAMILY_TITLES[entry.family]}
        </p>
        <p className="text-lead text-ink-soft">{entry.summary}</p>
        {geometry.ok ? (
          <ShapeDrawing
            drawing={geometry.geometry.drawing}
            toScale={geometry.geometry.toScale}
            labels={geometry.geometry.labels}
            terminals={entry.terminals}
          />
        ) : null}
        <p>
          The current enters through {entry.terminals.high} and leaves through {entry.terminals.low}.{" "}
          <SiteLink href={`/calculate/${entry.id}`} className="link">
            Calculate one
          </SiteLink>
          .
        </p>
        <h2 id="formula">Formula</h2>
        <Tex tex={entry.formula} display />
        <h2 id="dimensions">Dimensions</h2>
        <Dimensions entry={entry} />
        {entry.coordinates.length > 0 ? (
          <>
            <h2 id="coordinates">Coordinates and graded media</h2>
            <Coordinates entry={entry} />
          </>
        ) : null}
        <h2 id="validity">Where it holds</h2>
        <ul>
          {[...entry.validity, ...entry.assumptions].map((text) => (
            <li key={text}>{text}</li>
          ))}
        </ul>
        {entry.cautions.map((text) => (
          <Notice key={text} tone="caution">
            {text}
          </Notice>
        ))}
        <h2 id="accuracy">Accuracy</h2>
        <ShapeAccuracy result={result} />
        <h2 id="example">A worked example</h2>
        <WorkedExample result={result} />
        <h2 id="call">The call</h2>
        <Snippets snippets={shapeSnippets(sharedService().config.origin, shape)} />
        <p>
          <a href={`/docs/shapes/${entry.id}/template.csv`} download={`${entry.id}.csv`}>
            Table of requests to start from
          </a>{" "}
          for a <SiteLink href="/docs/spreadsheets#table">batch</SiteLink>, with this shape’s columns and its
          example as the first row.
        </p>
        <h2 id="sources">Sources</h2>
        <ul>
          {entry.sources.map(({ title, detail, provenance }) => (
            <li key={title}>
              {title}
              {detail ? `, ${detail}` : ""} ({provenance})
            </li>
          ))}
        </ul>
      </article>
      <PageLinks before={linkTo(catalogue[place - 1])} after={linkTo(catalogue[place + 1])} />
    </>
  );
}
