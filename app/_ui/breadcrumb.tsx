import Link from "next/link";

/** The way back up, above a page's title. */
export function Breadcrumb({
  trail,
}: {
  readonly trail: readonly { readonly href: string; readonly label: string }[];
}) {
  return (
    <nav aria-label="Breadcrumb" className="-mt-1.5 mb-0 text-small medium:mt-0 medium:mb-1">
      <ol className="flex flex-wrap gap-x-1 text-ink-soft">
        {trail.map(({ href, label }) => (
          <li key={href} className="flex items-center after:ms-1 after:content-['/'] last:after:content-none">
            <Link
              href={href}
              className="flex min-h-5.5 items-center rounded hover:text-ink hover:underline medium:min-h-0"
            >
              {label}
            </Link>
          </li>
        ))}
      </ol>
    </nav>
  );
}
