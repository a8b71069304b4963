import Link from "next/link";
import type { ComponentProps } from "react";

type Variant = "primary" | "plain" | "quiet" | "danger";

const BASE =
  "inline-flex min-h-5.5 medium:min-h-5 items-center justify-center gap-1 rounded border px-2 py-1 text-table font-medium no-underline cursor-pointer disabled:cursor-not-allowed disabled:opacity-55";

const VARIANTS: Record<Variant, string> = {
  primary: "border-copper bg-copper text-sheet hover:border-ink hover:bg-ink",
  plain: "border-edge bg-sheet text-ink hover:border-ink",
  quiet: "border-transparent bg-transparent text-ink-soft hover:border-edge hover:text-ink",
  danger: "border-oxide bg-sheet text-oxide hover:bg-oxide hover:text-sheet",
};

interface Look {
  readonly variant?: Variant;
}

/** A push button; it submits a form only if `type="submit"` is said. */
export function Button({
  variant = "plain",
  className = "",
  type = "button",
  ...rest
}: ComponentProps<"button"> & Look) {
  return <button type={type} className={`${BASE} ${VARIANTS[variant]} ${className}`} {...rest} />;
}

/** A link that looks like a button, for the one next step of a page. */
export function ButtonLink({
  variant = "plain",
  className = "",
  ...rest
}: ComponentProps<typeof Link> & Look) {
  return <Link className={`${BASE} ${VARIANTS[variant]} ${className}`} {...rest} />;
}
