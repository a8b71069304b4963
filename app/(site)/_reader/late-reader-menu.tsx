"use client";

import dynamic from "next/dynamic";
import type { ComponentProps } from "react";

/** Split off here, in a client module: what a server module imports late still stands in the script of its page. */
const ReaderMenu = dynamic(() =>
  import("../../console/_shell/reader-menu").then((module) => module.ReaderMenu),
);

/** The menu of a signed-in reader, whose script a signed-out reader's page does not load. */
export function LateReaderMenu(props: ComponentProps<typeof ReaderMenu>) {
  return <ReaderMenu {...props} />;
}
