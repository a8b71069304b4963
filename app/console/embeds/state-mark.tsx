import type { EmbedState } from "@/lib/embeds/embed-view";

const WORDS: Readonly<Record<EmbedState, { readonly text: string; readonly tone: string }>> = {
  draft: { text: "draft, on no page", tone: "text-ink-soft" },
  published: { text: "published", tone: "text-verdigris" },
  withdrawn: { text: "withdrawn", tone: "text-oxide" },
};

/** Where a widget stands, in words. */
export function StateMark({
  state,
  version,
}: {
  readonly state: EmbedState;
  readonly version: number | null;
}) {
  const { text, tone } = WORDS[state];
  return (
    <span className={`whitespace-nowrap ${tone}`}>
      {text}
      {version === null ? "" : `, version ${version}`}
    </span>
  );
}
