/**
 * Puts what a page shows into its address, without a navigation. The browser's own method is called, since the router's
 * would take it for a navigation and drop one that is under way, such as a press on Enter right after typing.
 */
export function replaceAddress(address: string): void {
  History.prototype.replaceState.call(window.history, window.history.state, "", address);
}
