"use client";

import { useSyncExternalStore } from "react";

const subscribe = (changed: () => void) => {
  window.addEventListener("hashchange", changed);
  return () => window.removeEventListener("hashchange", changed);
};

/**
 * The token of a single-use link, which stands behind the "#" where no server sees it.
 * Undefined until the page is awake; "" for an address without one.
 */
export function useLinkToken(): string | undefined {
  return useSyncExternalStore(
    subscribe,
    () => window.location.hash.slice(1),
    () => undefined,
  );
}
