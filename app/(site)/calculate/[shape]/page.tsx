import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { findShape, readQuantity, shapeEntry } from "@/lib/engine";
import { sharedService } from "@/lib/service/service";
import { Breadcrumb } from "../../../_ui/breadcrumb";
import { Tex } from "../../../_ui/tex";
import { Calculator } from "../_calculator/calculator";
import { FAMILY_TITLES } from "../_model/families";
import { exampleParameters } from "../_model/parameters";
import { plainDimensions, requestBody } from "../_model/request";
import { readState } from "../_model/variants";
import { firstAnswer } from "../_server/first-answer";
import { formDimensions, profileFacts } from "../_server/form-facts";
import { readGeometry } from "../_server/geometry";
import { materialChoices } from "../_server/material-choices";
import { readerMaterials } from "../_server/reader-materials";
import { savingFor } from "../_server/saving";

interface PageProps {
  readonly params: Promise<{ readonly shape: string }>;
  readonly searchParams: Promise<Readonly<Record<string, string | string[] | undefined>>>;
}

export async function generateMetadata({ params }: PageProps): Promise<Metadata> {
  const shape = findShape((await params).shape);
  return shape ? { title: shape.title, description: shape.summary } : { title: "No such shape" };
}

export default async function ShapePage({ params, searchParams }: PageProps) {
  const shape = findShape((await params).shape);
  if (!shape) notFound();
  const entry = shapeEntry(shape);
  const example = exampleParameters(entry);
  const state = readState(pairsOf(await searchParams), entry, example);
  const bodies = state.variants.map((variant) => requestBody(entry, variant));
  const active = state.variants[state.active];
  const geometry = readGeometry(shape, plainDimensions(entry, active));
  const exampleGeometry = readGeometry(shape, plainDimensions(entry, example));
  const drawn = geometry.ok ? geometry.geometry : exampleGeometry.ok ? exampleGeometry.geometry : null;
  const materials = await readerMaterials();
  const temperature = readQuantity(active.temperature?.trim() || 20, "temperature");
  return (
    <Calculator
      heading={
        <>
          <Breadcrumb trail={[{ href: "/calculate", label: "Calculate" }]} />
          <h1>{entry.title}</h1>
          <p className="mt-0.5 max-w-prose text-ink-soft">
            <span className="sr-only">{FAMILY_TITLES[entry.family]}. </span>
            {entry.summary}
          </p>
        </>
      }
      entry={entry}
      dimensions={formDimensions(shape, entry)}
      example={example}
      start={state}
      answers={bodies.map((body) => firstAnswer(body, materials.find))}
      geometry={drawn}
      materials={materialChoices(materials.all, temperature.ok ? temperature.value : 20)}
      profiles={entry.media.gradable.length > 0 ? profileFacts() : []}
      origin={sharedService().config.origin}
      saving={await savingFor(`/calculate/${entry.id}`)}
      formula={<Tex tex={entry.formula} display />}
    />
  );
}

function pairsOf(
  query: Readonly<Record<string, string | string[] | undefined>>,
): readonly (readonly [string, string])[] {
  return Object.entries(query).flatMap(([name, value]) => {
    const text = Array.isArray(value) ? value.at(-1) : value;
    return text === undefined ? [] : [[name, text] as const];
  });
}
