"use client";

import "./globals.css";

/** Shown when even the frame of the page failed; it stands alone, without the fonts and the header. */
export default function ServiceError({ error }: { error: Error & { digest?: string } }) {
  return (
    <html lang="en">
      <body>
        <title>Page failed · Rhoform</title>
        <main className="mx-auto max-w-page px-2 py-7">
          <h1>This page could not be shown</h1>
          <p className="mt-2">
            Something failed on the server. Reload the page
            {error.digest ? `; if it happens again, quote the reference ${error.digest}` : ""}.
          </p>
        </main>
      </body>
    </html>
  );
}
