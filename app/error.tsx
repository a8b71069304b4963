"use client";

import { useEffect, useRef } from "react";
import { Button } from "./_ui/button";

/** Shown in place of a page whose rendering failed; the reference lets an administrator find the log entry. */
export default function PageError({
  error,
  reset,
}: {
  error: Error & { digest?: string };
  reset: () => void;
}) {
  const heading = useRef<HTMLHeadingElement>(null);
  useEffect(() => heading.current?.focus(), []);

  return (
    <main className="mx-auto w-full max-w-page px-2 py-7 medium:px-4">
      <title>Page failed · Rhoform</title>
      <h1 ref={heading} tabIndex={-1} className="outline-none">
        This page could not be shown
      </h1>
      <p className="mt-2 max-w-prose">
        Something failed on the server. Stored data is not affected. If it happens again, tell whoever runs
        this service
        {error.digest ? (
          <>
            {" "}
            and quote the reference <code>{error.digest}</code>
          </>
        ) : null}
        .
      </p>
      <p className="mt-3">
        <Button variant="primary" onClick={reset}>
          Try again
        </Button>
      </p>
    </main>
  );
}
