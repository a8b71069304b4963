import "server-only";
import { headers } from "next/headers";
import { FRAME_HEADER } from "@/lib/embeds/frame-header";
import { parseTheme, type Theme } from "./_ui/theme";
import { readerTheme } from "./reader-theme";

interface DocumentFacts {
  /** BCP 47. */
  readonly locale: string;
  readonly theme: Theme;
}

/** Language and theme of the document: a widget's own, else English and what the reader chose. */
export async function documentFacts(): Promise<DocumentFacts> {
  const frame = (await headers()).get(FRAME_HEADER);
  if (!frame) return { locale: "en", theme: await readerTheme() };
  const { locale, theme }: { locale: string; theme: string } = JSON.parse(frame);
  return { locale, theme: parseTheme(theme) };
}
