import { computeResistance, libraryMaterial } from "@/lib/engine";
import { sharedService } from "@/lib/service/service";
import { SiteLink } from "../_ui/site/site-link";
import { LiveShell } from "./_live/live-shell";
import { SHELL_START, shellRequest } from "./_live/shell-request";

const NEXT = [
  {
    href: "/calculate",
    title: "Calculate",
    text: "Every shape of the catalogue, with its drawing, its field and the exact call.",
  },
  {
    href: "/outline",
    title: "Outline",
    text: "Draw any shape with holes and arcs, solve the field on it, and see the bracket close.",
  },
  {
    href: "/network",
    title: "Network",
    text: "The whole current path: bars, joints and braids between nodes, and where the loss is.",
  },
  {
    href: "/calculate/table",
    title: "Table",
    text: "Paste or upload up to 10,000 rows; each gets a number or a precise complaint.",
  },
  {
    href: "/docs/api",
    title: "API reference",
    text: "Every operation, with calls that can be sent from the page.",
  },
  { href: "/docs/problems", title: "Problems", text: "What each refusal means and what to do about it." },
] as const;

export default function Home() {
  const initial = computeResistance(shellRequest(SHELL_START), { material: libraryMaterial });
  return (
    <>
      <h1 className="max-w-[26ch]">
        From a shape, a material and two terminals to a resistance you can defend
      </h1>
      <p className="mt-2 mb-4 max-w-prose text-lead text-ink-soft">
        Every number comes with a lower and an upper bound, how they are known, and the checks it passed.
        Change a dimension: this page asks the same API that your programs call.
      </p>
      <LiveShell start={SHELL_START} initial={initial} origin={sharedService().config.origin} />
      <section aria-labelledby="next" className="mt-5 border-t border-rule pt-3">
        <h2 id="next">Where to go next</h2>
        <ul className="mt-2 grid gap-3 medium:grid-cols-2 wide:grid-cols-3">
          {NEXT.map(({ href, title, text }) => (
            <li key={href}>
              <h3>
                <SiteLink href={href} className="link inline-flex min-h-5.5 items-center medium:min-h-0">
                  {title}
                </SiteLink>
              </h3>
              <p className="text-ink-soft">{text}</p>
            </li>
          ))}
        </ul>
      </section>
    </>
  );
}
