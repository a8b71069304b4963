import { symbolParts } from "./symbol-text";

/** A quantity's symbol in running text: italic, its subscript upright and low. */
export function QuantitySymbol({ text }: { readonly text: string }) {
  return (
    <span className="whitespace-nowrap">
      {symbolParts(text).map((part, index) =>
        part.sub ? (
          <sub key={index} className="text-[0.75em]">
            {part.text}
          </sub>
        ) : (
          <i key={index}>{part.text}</i>
        ),
      )}
    </span>
  );
}
