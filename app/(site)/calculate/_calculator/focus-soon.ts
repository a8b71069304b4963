/** Focuses the first of the elements that is there once the page has been drawn again; a field's text is selected. */
export function focusSoon(...ids: readonly string[]): void {
  requestAnimationFrame(() => {
    const found = ids.map((id) => document.getElementById(id)).find((element) => element !== null);
    found?.focus();
    if (found instanceof HTMLInputElement) found.select();
  });
}
