import { Fragment } from "react";
import { SiteLink } from "../../../_ui/site/site-link";

const MARKUP = /(`[^`]+`|\*\*[^*]+\*\*|\[[^\]]+\]\([^)]+\))/;

/** Running text of the docs: `code`, **strong**, [link](address), and code in a link. */
export function Inline({ text }: { readonly text: string }) {
  return text.split(MARKUP).map((part, index) => {
    if (part.startsWith("`") && part.length > 2) return <code key={index}>{part.slice(1, -1)}</code>;
    if (part.startsWith("**")) return <strong key={index}>{part.slice(2, -2)}</strong>;
    const link = /^\[([^\]]+)\]\(([^)]+)\)$/.exec(part);
    if (link)
      return (
        <SiteLink key={index} href={link[2]} className="link">
          <Inline text={link[1]} />
        </SiteLink>
      );
    return <Fragment key={index}>{part}</Fragment>;
  });
}

/** The same without its marks, for search. What stands in code keeps its own stars and brackets. */
export function plainText(text: string): string {
  return text
    .split(MARKUP)
    .map((part) => {
      if (part.startsWith("`") && part.length > 2) return part.slice(1, -1);
      if (part.startsWith("**")) return part.slice(2, -2);
      return /^\[([^\]]+)\]\([^)]+\)$/.exec(part)?.[1].replace(/`/g, "") ?? part;
    })
    .join("");
}
