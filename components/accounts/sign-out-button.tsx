"use client";

import { signOut } from "@/components/accounts/session-calls";

/** For the dark bar. */
export function SignOutButton() {
  return (
    <button
      type="button"
      onClick={() => void signOut()}
      className="min-h-11 rounded border border-deep-soft px-4 font-plate text-[1.1rem] font-semibold text-deep-ink"
    >
      Sign out
    </button>
  );
}
