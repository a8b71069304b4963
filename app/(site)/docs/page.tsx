import type { Metadata } from "next";
import { SiteLink } from "../../_ui/site/site-link";

export const metadata: Metadata = { title: "Docs" };

const PAGES = [
  {
    href: "/docs/api",
    title: "API reference",
    text: "Every operation with its request, its answers and its refusals; calls can be sent from the page.",
  },
  {
    href: "/docs/problems",
    title: "Problems",
    text: "What each refusal means and what to do about it. Every error answer links to its page.",
  },
  {
    href: "/docs/accuracy",
    title: "Accuracy",
    text: "How far the engine strays from numbers outside of it, group by group, written from the tests' own results.",
  },
  {
    href: "/docs/changelog",
    title: "Changelog",
    text: "What each version brought, and every change of a number by more than its bounds.",
  },
] as const;

export default function Docs() {
  return (
    <>
      <h1>Docs</h1>
      <p className="mt-2 max-w-prose text-lead text-ink-soft">
        The API is one address, JSON in and JSON out. Numbers are SI, or carry their unit; refusals are
        problem documents that point at the field.
      </p>
      <ul className="mt-4 grid max-w-prose gap-3 border-t border-rule pt-3">
        {PAGES.map(({ href, title, text }) => (
          <li key={href}>
            <h2 className="text-h3">
              <SiteLink href={href} className="link">
                {title}
              </SiteLink>
            </h2>
            <p className="text-ink-soft">{text}</p>
          </li>
        ))}
        <li>
          <h2 className="text-h3">
            <SiteLink href="/api/v1/openapi.json" className="link">
              OpenAPI document
            </SiteLink>
          </h2>
          <p className="text-ink-soft">The contract for generators and other tools, version 3.1, as JSON.</p>
        </li>
      </ul>
    </>
  );
}
