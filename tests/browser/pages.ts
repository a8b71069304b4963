/** Every kind of public page, for the checks that hold for all of them. */
export const PAGES = [
  "/",
  "/calculate",
  "/calculate/cylindrical-shell",
  "/calculate/bar?length=250mm&width=5kg&thickness=5mm&graded=length&quantity=conductivity&profile=layers&profile.layers=100mm:58MS/m,100mm:30MS/m",
  "/calculate/tapered-strip?B&B.length=30mm&C&C.resistivity=28nohm+m&C.without=material&D&D.thickness=70um&max=10mohm&current=2A",
  "/calculate/clad-wire",
  "/calculate/bar?width=50mm&width.tolerance=0.4mm&width.distribution=normal&length=1m&thickness=10mm&uncertainty=worst-case&solveFor=width&target=30uohm",
  "/outline",
  "/docs",
  "/docs/design",
  "/docs/problems",
  "/docs/problems/invalid-input",
  "/docs/accuracy",
  "/docs/changelog",
  "/no-such-page",
] as const;
