/** Asks the docs' own search; needs no script. */
export function SearchForm({
  id,
  query = "",
  focus = false,
}: {
  readonly id: string;
  readonly query?: string;
  readonly focus?: boolean;
}) {
  return (
    <form action="/docs/search" role="search" className="flex gap-0.5 print:hidden">
      <label htmlFor={id} className="sr-only">
        Search the docs
      </label>
      <input
        id={id}
        name="q"
        type="search"
        defaultValue={query}
        autoFocus={focus}
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
