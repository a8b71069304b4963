import type { Metadata, Viewport } from "next";
import type { ReactNode } from "react";
import { mono, sans, sansExtended } from "./fonts";
import { documentFacts } from "./document-facts";
import "./globals.css";

export const metadata: Metadata = {
  title: { default: "Rhoform", template: "%s · Rhoform" },
  description:
    "From a shape, a material and two terminals to a DC resistance that can be defended: one number with its bounds, its method and its sources.",
};

export const viewport: Viewport = {
  width: "device-width",
  initialScale: 1,
  themeColor: [
    { media: "(prefers-color-scheme: light)", color: "#faf8f3" },
    { media: "(prefers-color-scheme: dark)", color: "#14181a" },
  ],
};

/** Reading the request here makes every page render per request, which the nonce of its scripts needs. */
export default async function RootLayout({ children }: { readonly children: ReactNode }) {
  const { locale, theme } = await documentFacts();
  return (
    <html
      lang={locale}
      data-theme={theme === "system" ? undefined : theme}
      className={`${sans.variable} ${sansExtended.variable} ${mono.variable}`}
      suppressHydrationWarning
    >
      <body>{children}</body>
    </html>
  );
}
