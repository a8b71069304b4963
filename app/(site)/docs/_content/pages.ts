import { accessibility } from "./accessibility";
import { authentication } from "./authentication";
import { batches } from "./batches";
import { bounds } from "./bounds";
import { clients } from "./clients";
import { embedding } from "./embedding";
import { errors } from "./errors";
import { fields } from "./fields";
import { limits } from "./limits";
import { materials } from "./materials";
import { media } from "./media";
import { methods } from "./methods";
import { networks } from "./networks";
import { operatingPoint } from "./operating-point";
import { type DocPage, type Existing, type Group, hrefOf } from "./page";
import { quantities } from "./quantities";
import { records } from "./records";
import { running } from "./running";
import { sizing } from "./sizing";
import { spreadsheets } from "./spreadsheets";
import { start } from "./start";
import { uncertainty } from "./uncertainty";
import { versioning } from "./versioning";

/** All pages in the order of the contents. */
export const GROUPS: readonly Group[] = [
  { title: "Ways in", pages: [start, clients, spreadsheets, embedding, authentication] },
  {
    title: "One resistance",
    pages: [
      {
        href: "/docs/shapes",
        title: "Shapes",
        summary: "Every shape: drawing, dimensions, formula, where it holds, and the call in every language.",
      },
      quantities,
      media,
      operatingPoint,
      bounds,
      uncertainty,
      sizing,
    ],
  },
  { title: "More than one", pages: [batches, networks, fields] },
  { title: "What is kept", pages: [materials, records] },
  {
    title: "The protocol",
    pages: [
      {
        href: "/docs/api",
        title: "API reference",
        summary: "Every operation with its request, answers and refusals; calls can be sent from the page.",
      },
      errors,
      {
        href: "/docs/problems",
        title: "Problems",
        summary: "What each refusal means and what to do about it. Every error answer links to its page.",
      },
      limits,
      versioning,
    ],
  },
  {
    title: "About the service",
    pages: [
      running,
      {
        href: "/docs/permissions",
        title: "Roles and permissions",
        summary: "Who may do what to whose things: the table that pages and calls ask.",
      },
      methods,
      {
        href: "/docs/accuracy",
        title: "Accuracy",
        summary: "How far the engine strays from numbers outside of it, written from the tests’ own results.",
      },
      {
        href: "/docs/changelog",
        title: "Changelog",
        summary: "What each version brought, and every change of a number by more than its bounds.",
      },
      accessibility,
    ],
  },
];

const ALL = GROUPS.flatMap(({ pages }) => pages);

export const GUIDES: readonly DocPage[] = ALL.flatMap((page) => ("slug" in page ? [page] : []));

export function guideOf(slug: string): DocPage | undefined {
  return GUIDES.find((guide) => guide.slug === slug);
}

/** The pages before and after one in the contents. */
export function neighbours(href: string): {
  readonly before: DocPage | Existing | undefined;
  readonly after: DocPage | Existing | undefined;
} {
  const place = ALL.findIndex((page) => hrefOf(page) === href);
  return { before: ALL[place - 1], after: place < 0 ? undefined : ALL[place + 1] };
}
