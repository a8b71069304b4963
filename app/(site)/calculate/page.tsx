import type { Metadata } from "next";
import Link from "next/link";
import { catalogue, type Shape, shapeEntry } from "@/lib/engine";
import { CatalogueSheet, type CatalogueSection } from "./_catalogue/catalogue-sheet";
import { Thumbnail } from "./_catalogue/thumbnail";
import { FAMILIES, FAMILY_NOTES, FAMILY_TITLES } from "./_model/families";
import { searchText } from "./_catalogue/search";

export const metadata: Metadata = {
  title: "Calculate",
  description: "Every shape of the catalogue with its drawing: pick one and put a resistance on it.",
};

interface PageProps {
  readonly searchParams: Promise<Readonly<Record<string, string | string[] | undefined>>>;
}

/** The catalogue as a sheet of drawings. */
export default async function CataloguePage({ searchParams }: PageProps) {
  const { q } = await searchParams;
  const sections = FAMILIES.map((family): CatalogueSection => {
    const shapes = catalogue.filter((shape) => shape.family === family);
    return { family, title: FAMILY_TITLES[family], note: FAMILY_NOTES[family], shapes: shapes.map(card) };
  }).filter(({ shapes }) => shapes.length > 0);
  return (
    <>
      <h1>Calculate</h1>
      <p className="mt-1 mb-3 max-w-prose text-ink-soft">
        Pick the shape that carries the current. Each drawing shows its example: copper edge the high
        terminal, verdigris edge the low one. What is not here can be drawn as an{" "}
        <Link href="/outline" className="link">
          outline
        </Link>
        . For many at once there is the{" "}
        <Link href="/calculate/table" className="link">
          table
        </Link>
        , for a whole current path the{" "}
        <Link href="/network" className="link">
          network
        </Link>
        .
      </p>
      <CatalogueSheet sections={sections} start={typeof q === "string" ? q : ""} />
    </>
  );
}

function card(shape: Shape): CatalogueSection["shapes"][number] {
  const { id, title, summary } = shape;
  return {
    id,
    title,
    summary,
    search: searchText(shapeEntry(shape)),
    picture: <Thumbnail shape={shape} />,
  };
}
