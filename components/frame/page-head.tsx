import type { ReactNode } from "react";

/** What this page is, and in one line what is to be done next. */
export function PageHead({ title, next, actions }: { title: ReactNode; next?: ReactNode; actions?: ReactNode }) {
  return (
    <div className="mb-4 flex flex-wrap items-end justify-between gap-x-6 gap-y-3">
      <div className="min-w-0">
        <h1 className="text-[1.9rem] leading-[1.05] sm:text-[2.2rem]">{title}</h1>
        {next && <p className="mt-1.5 max-w-[70ch] text-ink2">{next}</p>}
      </div>
      {actions && (
        <div className="flex flex-wrap gap-3" data-no-print>
          {actions}
        </div>
      )}
    </div>
  );
}
