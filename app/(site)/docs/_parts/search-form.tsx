/** Asks the docs' own search; needs no script. */
export function SearchForm({
  id,
  label = "Search from the contents",
  query = "",
}: {
  readonly id: string;
  /** Tells the forms of one page apart. */
  readonly label?: string;
  readonly query?: string;
}) {
  return (
    <form action="/docs/search" role="search" aria-label={label} className="flex gap-0.5 print:hidden">
      <label htmlFor={id} className="sr-only">
        Search the docs
      </label>
      <input
        id={id}
        name="q"
        type="search"
        defaultValue={query}
        placeholder="Words"
        className="min-h-5.5 w-full min-w-0 rounded border border-edge bg-sheet px-1 text-table medium:min-h-4"
      />
      <button
        type="submit"
        className="min-h-5.5 shrink-0 cursor-pointer rounded border border-edge bg-sheet px-1.5 text-table hover:border-ink medium:min-h-4"
      >
        Search
      </button>
    </form>
  );
}
