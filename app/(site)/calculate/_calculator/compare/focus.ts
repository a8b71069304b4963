/** Where focus goes when a variant comes or goes, since the button that was pressed may be gone then. */
export const COMPARE_ID = "compare-with-variant";

export function variantId(index: number): string {
  return `variant-${index}`;
}
