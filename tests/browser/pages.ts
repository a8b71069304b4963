/** Every kind of public page, for the checks that hold for all of them. */
export const PAGES = [
  "/",
  "/docs",
  "/docs/problems",
  "/docs/problems/invalid-input",
  "/docs/changelog",
  "/no-such-page",
] as const;
