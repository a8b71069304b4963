import type { ReactNode } from "react";

interface PageHeadProps {
  readonly title: ReactNode;
  /** One sentence, where the title does not say it all. */
  readonly children?: ReactNode;
  readonly actions?: ReactNode;
}

/** Title of a console page with what can be done on all of it. */
export function PageHead({ title, children, actions }: PageHeadProps) {
  return (
    <div className="mb-3 flex flex-wrap items-end gap-x-3 gap-y-1.5">
      <div className="min-w-0 grow">
        <h1 className="[overflow-wrap:anywhere]">{title}</h1>
        {children ? <div className="mt-0.5 max-w-prose text-table text-ink-soft">{children}</div> : null}
      </div>
      {actions ? <div className="flex flex-wrap gap-1">{actions}</div> : null}
    </div>
  );
}
