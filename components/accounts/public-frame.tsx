import Link from "next/link";
import type { ReactNode } from "react";
import { Logo } from "@/components/bolt/logo";

/** Around the pages that stand outside any organisation: the mark, and one narrow sheet. */
export function PublicFrame({ children, aside }: { children: ReactNode; aside?: ReactNode }) {
  return (
    <div className="flex min-h-dvh flex-col">
      <header data-on-deep className="flex min-h-14 items-center justify-between gap-4 bg-deep px-4 text-deep-ink sm:px-6" data-no-print>
        <Link href="/" className="flex min-h-11 items-center gap-2.5 font-plate text-[1.4rem] font-semibold">
          <Logo />
          Witnessline
        </Link>
        {aside}
      </header>
      {children}
    </div>
  );
}

/** One sheet in the middle, for a form and little else. */
export function NarrowSheet({ title, next, children }: { title: ReactNode; next?: ReactNode; children: ReactNode }) {
  return (
    <main id="main" tabIndex={-1} className="mx-auto w-full max-w-xl px-4 py-6 outline-none sm:py-12">
      <section className="rounded border border-rule bg-sheet">
        <div className="border-b-2 border-steel px-5 py-5 sm:px-7">
          <h1 className="text-[2rem] leading-[1.05]">{title}</h1>
          {next && <p className="mt-2 text-ink2">{next}</p>}
        </div>
        <div className="grid gap-5 px-5 py-6 sm:px-7">{children}</div>
      </section>
    </main>
  );
}
