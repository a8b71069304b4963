/** The pages for work, and those around them. */
export const WORK_PAGES = [
  "/",
  "/calculate",
  "/calculate/cylindrical-shell",
  "/calculate/bar?length=250mm&width=5kg&thickness=5mm&graded=length&quantity=conductivity&profile=layers&profile.layers=100mm:58MS/m,100mm:30MS/m",
  "/calculate/tapered-strip?B&B.length=30mm&C&C.resistivity=28nohm+m&C.without=material&D&D.thickness=70um&max=10mohm&current=2A",
  "/calculate/clad-wire",
  "/calculate/table?shape=clad-wire",
  "/network",
  "/calculate/bar?width=50mm&width.tolerance=0.4mm&width.distribution=normal&length=1m&thickness=10mm&uncertainty=worst-case&solveFor=width&target=30uohm",
  "/outline",
  "/sign-in",
  "/forgotten",
  "/invitation/a-link-that-is-over",
  "/no-such-page",
] as const;

/** The pages that are read. */
export const DOCS_PAGES = [
  "/docs",
  "/docs/start",
  "/docs/fields",
  "/docs/running",
  "/docs/shapes",
  "/docs/shapes/conical-shell",
  "/docs/search?q=bounds",
  "/docs/design",
  "/docs/problems",
  "/docs/problems/invalid-input",
  "/docs/accuracy",
  "/docs/permissions",
  "/docs/changelog",
] as const;

/** Every kind of public page, for the checks that hold for all of them. */
export const PAGES = [...WORK_PAGES, ...DOCS_PAGES] as const;
