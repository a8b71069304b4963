import "server-only";
import katex from "katex";
import "katex/dist/katex.min.css";

/** A formula, typeset on the server; the MathML beside it is what screen readers and copying take. */
export function Tex({ tex, display = false }: { readonly tex: string; readonly display?: boolean }) {
  const html = katex.renderToString(tex, {
    displayMode: display,
    throwOnError: false,
    strict: "ignore",
    trust: false,
  });
  const Element = display ? "div" : "span";
  return (
    <Element
      // A wide formula scrolls, so the keyboard must reach it.
      {...(display ? { tabIndex: 0, role: "group", "aria-label": "Formula" } : {})}
      className={display ? "overflow-x-auto overflow-y-hidden py-0.5" : undefined}
      dangerouslySetInnerHTML={{ __html: html }}
    />
  );
}
