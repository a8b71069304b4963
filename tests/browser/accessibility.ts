import AxeBuilder from "@axe-core/playwright";
import type { Page } from "playwright-core";

const STANDARDS = ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa", "best-practice"];

interface Scope {
  /** Selector of the only part that is looked at; the whole page where left out. */
  readonly include?: string;
  /** Selector of a part that is not ours to mend. */
  readonly exclude?: string;
  /** Ids of the only rules that are tried; those of WCAG 2.2 AA and of good practice where left out. */
  readonly rules?: readonly string[];
}

/** Violations that axe finds on the page as it is, each with the places where it finds it. */
export async function axeViolations(
  page: Page,
  { include, exclude, rules }: Scope = {},
): Promise<readonly string[]> {
  const builder = new AxeBuilder({ page })
    .options({
      runOnly: rules ? { type: "rule", values: [...rules] } : { type: "tag", values: STANDARDS },
      // Of what passes, one example a rule: describing each takes most of the time.
      resultTypes: ["violations"],
    })
    // Only a page with frames needs the slower way that looks into them.
    .setLegacyMode(page.frames().length === 1);
  if (include) builder.include(include);
  if (exclude) builder.exclude(exclude);
  const { violations } = await builder.analyze();
  return violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ target }) => String(target)).join(" | ")}`);
}
