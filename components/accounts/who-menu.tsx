"use client";

import Link from "next/link";
import { signOut } from "@/components/accounts/session-calls";
import { ThemeChoice } from "@/components/accounts/theme-choice";

type WhoMenuProps = {
  name: string;
  roleLabel: string;
  organisation: string;
  /** Key of the post whose rail is shown. */
  current: string;
  /** Everything that the person is, everywhere; the switch is shown where there is more than one. */
  posts: readonly { key: string; roleLabel: string; organisation: string; href: string }[];
};

const ITEM = "flex min-h-11 w-full items-center rounded px-3 text-left hover:bg-tint";

/** Who is signed in, as what, where; and the way to their account, their other roles, the colours and out. A popover of the browser's own. */
export function WhoMenu({ name, roleLabel, organisation, current, posts }: WhoMenuProps) {
  return (
    <>
      <button
        type="button"
        popoverTarget="who-menu"
        className="flex min-h-11 items-center gap-2 rounded px-2 text-left text-[0.95rem] leading-tight text-deep-soft hover:text-deep-ink"
      >
        <span className="grid">
          <span className="max-w-[46vw] truncate font-semibold text-deep-ink sm:max-w-none">{name}</span>
          <span className="max-w-[42vw] truncate text-[0.85rem] sm:max-w-none">
            {roleLabel}
            <span className="hidden sm:inline">, {organisation}</span>
          </span>
        </span>
        <svg viewBox="0 0 12 8" width="12" height="8" aria-hidden className="shrink-0">
          <path d="M1 1.5 6 6.5 11 1.5" fill="none" stroke="currentColor" strokeWidth="2" />
        </svg>
        <span className="sr-only">: your menu</span>
      </button>
      <div
        id="who-menu"
        popover="auto"
        className="fixed inset-auto right-2 top-14 m-0 max-h-[calc(100dvh-4rem)] w-[min(22rem,calc(100vw-1rem))] overflow-auto rounded border border-steel bg-sheet p-2 text-ink"
      >
        <p className="px-3 pb-2 pt-1">
          <span className="block font-plate text-[1.3rem] font-semibold leading-tight">{name}</span>
          <span className="text-sm text-ink2">
            {roleLabel}, {organisation}
          </span>
        </p>
        {posts.length > 1 && (
          <nav aria-label="Work as" className="border-t border-rule py-2">
            <p className="px-3 pb-1 font-plate text-[1.05rem] font-semibold text-ink2">Work as</p>
            <ul>
              {posts.map((post) => (
                <li key={post.key}>
                  <Link
                    href={post.href}
                    className={`${ITEM} ${post.key === current ? "border-l-4 border-l-strong bg-tint" : ""}`}
                    onClick={closeMenu}
                    {...(post.key === current ? { "aria-current": "true" as const } : {})}
                  >
                    <span>
                      <span className="block font-semibold leading-tight">{post.roleLabel}</span>
                      <span className="block text-sm text-ink2">{post.organisation}</span>
                    </span>
                  </Link>
                </li>
              ))}
            </ul>
          </nav>
        )}
        <div className="border-t border-rule px-3 pb-3 pt-2">
          <p className="pb-1 font-plate text-[1.05rem] font-semibold text-ink2">Colours</p>
          <ThemeChoice />
        </div>
        <div className="border-t border-rule pt-2">
          <Link href="/account" className={ITEM} onClick={closeMenu}>
            Account and devices
          </Link>
          <button type="button" className={ITEM} onClick={() => void signOut()}>
            Sign out
          </button>
        </div>
      </div>
    </>
  );
}

const closeMenu = () => document.getElementById("who-menu")?.hidePopover();
