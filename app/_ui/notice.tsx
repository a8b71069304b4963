import type { ReactNode } from "react";

type Tone = "plain" | "caution" | "problem";

const TONES: Record<Tone, { readonly border: string; readonly word: string; readonly text: string }> = {
  plain: { border: "border-s-edge", word: "Note", text: "text-ink-soft" },
  caution: { border: "border-s-amber", word: "Caution", text: "text-amber" },
  problem: { border: "border-s-oxide", word: "Problem", text: "text-oxide" },
};

interface NoticeProps {
  readonly tone?: Tone;
  readonly title?: string;
  readonly children?: ReactNode;
}

/** A remark set off by a rule; its kind is said in words, not by colour alone. */
export function Notice({ tone = "plain", title, children }: NoticeProps) {
  const { border, word, text } = TONES[tone];
  return (
    <div className={`border-s-3 ps-2 ${border}`}>
      <p className={`text-table font-semibold ${text}`}>{title ?? word}</p>
      {children ? <div className="text-table">{children}</div> : null}
    </div>
  );
}
