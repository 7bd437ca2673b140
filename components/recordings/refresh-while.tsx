"use client";

import { useRouter } from "next/navigation";
import { useEffect } from "react";

const EVERY_MS = 4000;

/** Shows the page anew every few seconds while something on it is under way and somebody looks. */
export function RefreshWhile({ active }: { active: boolean }) {
  const router = useRouter();
  useEffect(() => {
    if (!active) return;
    const timer = setInterval(() => document.visibilityState === "visible" && router.refresh(), EVERY_MS);
    return () => clearInterval(timer);
  }, [active, router]);
  return null;
}
