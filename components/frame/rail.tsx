import Link from "next/link";
import type { ReactNode } from "react";
import { Logo } from "@/components/bolt/logo";

export type RailLink = { label: string; href: string; current: boolean };

type RailProps = {
  /** Where the mark leads. */
  home: string;
  /** At most five. */
  places: readonly RailLink[];
  /** Who is signed in, and their menu. */
  who: ReactNode;
};

/** The person's work, not a tree of menus. On a desk it lies on top; on a phone the places are at the thumb. */
export function Rail({ home, places, who }: RailProps) {
  return (
    <>
      <header data-on-deep data-no-print className="flex min-h-14 items-stretch gap-6 bg-deep px-3 text-deep-ink sm:px-6">
        <Link href={home} className="flex items-center gap-2.5 font-plate text-[1.4rem] font-semibold">
          <Logo />
          <span className="max-[359px]:sr-only">Witnessline</span>
        </Link>
        <nav aria-label="Places" className="hidden items-stretch gap-6 md:flex">
          {places.map((place) => (
            <RailPlace key={place.href} place={place} className="border-y-4 border-t-transparent px-0.5" edge="border-b-deep-line" />
          ))}
        </nav>
        <div className="ml-auto flex items-center">{who}</div>
      </header>
      <nav
        aria-label="Places"
        data-on-deep
        data-no-print
        className="fixed inset-x-0 bottom-0 z-20 flex bg-deep pb-[env(safe-area-inset-bottom)] text-deep-ink md:hidden"
      >
        {places.map((place) => (
          <RailPlace key={place.href} place={place} className="min-h-15 flex-auto justify-center border-t-4 px-1 text-center" edge="border-t-deep-line" />
        ))}
      </nav>
    </>
  );
}

function RailPlace({ place, className, edge }: { place: RailLink; className: string; edge: string }) {
  return (
    <Link
      href={place.href}
      {...(place.current ? { "aria-current": "page" as const } : {})}
      className={`flex items-center font-plate text-[1.15rem] font-semibold leading-tight ${className} ${
        place.current ? `${edge} text-deep-ink` : "border-transparent text-deep-soft hover:text-deep-ink"
      }`}
    >
      {place.label}
    </Link>
  );
}
