const SUBSCRIPTS: Readonly<Record<string, string>> = {
  "₀": "0",
  "₁": "1",
  "₂": "2",
  "₃": "3",
  "₄": "4",
  "₅": "5",
  "₆": "6",
  "₇": "7",
  "₈": "8",
  "₉": "9",
  ₐ: "a",
  ₑ: "e",
  ₕ: "h",
  ᵢ: "i",
  ₖ: "k",
  ₗ: "l",
  ₘ: "m",
  ₙ: "n",
  ₒ: "o",
  ₚ: "p",
  ᵣ: "r",
  ₛ: "s",
  ₜ: "t",
  ᵤ: "u",
  ₓ: "x",
};

export interface SymbolPart {
  readonly text: string;
  readonly sub: boolean;
}

/** Splits a symbol such as "r₁" into its letter and its subscript, since our typeface has no small digits. */
export function symbolParts(symbol: string): readonly SymbolPart[] {
  const parts: { text: string; sub: boolean }[] = [];
  for (const character of symbol) {
    const sub = character in SUBSCRIPTS;
    const text = sub ? SUBSCRIPTS[character] : character;
    const last = parts.at(-1);
    if (last && last.sub === sub) last.text += text;
    else parts.push({ text, sub });
  }
  return parts;
}
