import localFont from "next/font/local";

export const sans = localFont({
  src: "../fonts/spline-sans.woff2",
  weight: "300 700",
  variable: "--font-spline-sans",
  display: "swap",
  fallback: ["system-ui", "sans-serif"],
});

/** Letters beyond Western European ones; fetched only where a page has one. */
export const sansExtended = localFont({
  src: "../fonts/spline-sans-ext.woff2",
  weight: "300 700",
  variable: "--font-spline-sans-ext",
  display: "swap",
  preload: false,
  adjustFontFallback: false,
  declarations: [
    {
      prop: "unicode-range",
      value:
        "U+0100-02BA, U+02BD-02C5, U+02C7-02CC, U+02CE-02D7, U+02DD-02FF, U+0304, U+0308, U+0329, U+1D00-1DBF, U+1E00-1E9F, U+1EF2-1EFF, U+2020, U+20A0-20AB, U+20AD-20C0, U+2113, U+2C60-2C7F, U+A720-A7FF",
    },
  ],
});

export const mono = localFont({
  src: [
    { path: "../fonts/spline-sans-mono-400.woff2", weight: "400" },
    { path: "../fonts/spline-sans-mono-500.woff2", weight: "500" },
    { path: "../fonts/spline-sans-mono-600.woff2", weight: "600" },
  ],
  variable: "--font-spline-mono",
  display: "swap",
  fallback: ["ui-monospace", "monospace"],
});
