type Tone = "good" | "plain" | "caution" | "bad";

const TONES: Readonly<Record<Tone, string>> = {
  good: "border-verdigris text-verdigris",
  plain: "border-edge text-ink-soft",
  caution: "border-amber text-amber",
  bad: "border-oxide text-oxide",
};

/** A state in a word; the colour only repeats it. */
export function StateWord({ tone, children }: { readonly tone: Tone; readonly children: string }) {
  return (
    <span className={`inline-block rounded border px-0.5 text-small whitespace-nowrap ${TONES[tone]}`}>
      {children}
    </span>
  );
}
