import Link from "next/link";

/** The way back up, above a page's title. */
export function Breadcrumb({
  trail,
}: {
  readonly trail: readonly { readonly href: string; readonly label: string }[];
}) {
  return (
    <nav aria-label="Breadcrumb" className="mb-1 text-small">
      <ol className="flex flex-wrap gap-x-1 text-ink-soft">
        {trail.map(({ href, label }) => (
          <li key={href} className="after:ms-1 after:content-['/'] last:after:content-none">
            <Link href={href} className="rounded hover:text-ink hover:underline">
              {label}
            </Link>
          </li>
        ))}
      </ol>
    </nav>
  );
}
