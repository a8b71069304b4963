/** The header's links, on every public page and on the API reference, which is served whole. */
export const NAVIGATION = [
  { href: "/calculate", label: "Calculate" },
  { href: "/outline", label: "Outline" },
  { href: "/network", label: "Network" },
  { href: "/docs", label: "Docs" },
  { href: "/docs/api", label: "API reference" },
  { href: "/console", label: "Console" },
] as const;
