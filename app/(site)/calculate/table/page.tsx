import type { Metadata } from "next";
import { findShape } from "@/lib/engine";
import { Breadcrumb } from "../../../_ui/breadcrumb";
import { tableVocabulary } from "./_server/vocabulary";
import { TablePage } from "./_table/table-page";

export const metadata: Metadata = {
  title: "Table",
  description:
    "Up to 10,000 resistances at once: paste or upload rows, and get a number or a complaint for each.",
};

interface PageProps {
  readonly searchParams: Promise<Readonly<Record<string, string | string[] | undefined>>>;
}

export default async function Table({ searchParams }: PageProps) {
  const { shape } = await searchParams;
  const asked = typeof shape === "string" ? (findShape(shape)?.id ?? null) : null;
  return (
    <TablePage
      key={asked ?? ""}
      vocabulary={tableVocabulary()}
      shape={asked}
      heading={
        <>
          <Breadcrumb trail={[{ href: "/calculate", label: "Calculate" }]} />
          <h1>Table</h1>
          <p className="mt-0.5 max-w-prose text-ink-soft">
            Up to 10,000 resistances at once. Every row is answered or refused on its own.
          </p>
        </>
      }
    />
  );
}
