import type { ReactNode } from "react";

/** The page's own area; leaves room for the rail that lies at the thumb on a phone. */
export function Page({ children, narrow = false }: { children: ReactNode; narrow?: boolean }) {
  return (
    <main id="main" tabIndex={-1} className={`mx-auto w-full px-4 pb-28 pt-5 outline-none sm:px-6 sm:pb-10 ${narrow ? "max-w-3xl" : "max-w-[100rem]"}`}>
      {children}
    </main>
  );
}

/** A sheet on the enamel: one purpose, one hairline. */
export function Sheet({ children, className = "" }: { children: ReactNode; className?: string }) {
  return <section className={`rounded border border-rule bg-sheet ${className}`}>{children}</section>;
}

/** A part of a sheet with a heading of its own. */
export function SheetPart({ title, actions, children }: { title: ReactNode; actions?: ReactNode; children: ReactNode }) {
  return (
    <div className="border-b border-rule px-4 py-4 last:border-b-0 sm:px-5">
      <div className="mb-2 flex flex-wrap items-center justify-between gap-3">
        <h2 className="text-[1.4rem] leading-tight">{title}</h2>
        {actions}
      </div>
      {children}
    </div>
  );
}
