/** Where focus goes when a part of the page comes or goes, since the button that was pressed may be gone then. */
export const COMPARE_ID = "compare-with-variant";

export function variantId(index: number): string {
  return `variant-${index}`;
}

/** Focuses the first of the elements that is there once the page has been drawn again; a field's text is selected. */
export function focusSoon(...ids: readonly string[]): void {
  requestAnimationFrame(() => {
    const found = ids.map((id) => document.getElementById(id)).find((element) => element !== null);
    found?.focus();
    if (found instanceof HTMLInputElement) found.select();
  });
}
