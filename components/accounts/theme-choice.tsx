"use client";

import { useState } from "react";
import { Segmented } from "@/components/ui/segmented";

const THEMES = [
  { value: "system", label: "Device" },
  { value: "light", label: "Light" },
  { value: "dark", label: "Dark" },
] as const;
type Theme = (typeof THEMES)[number]["value"];

/** Light or dark, kept in a cookie that the server reads, so that the page comes in the right colours from its first byte. */
export function ThemeChoice() {
  // Unknown on the server and while the page wakes up; read from the page itself when the menu is used.
  const [theme, setTheme] = useState<Theme | null>(null);
  function choose(next: Theme) {
    setTheme(next);
    if (next === "system") delete document.documentElement.dataset.theme;
    else document.documentElement.dataset.theme = next;
    document.cookie = `theme=${next}; path=/; max-age=${next === "system" ? 0 : 365 * 24 * 3600}; samesite=lax`;
  }
  return (
    <div ref={(element) => void (element && theme === null && setTheme(themeOfPage()))}>
      <Segmented legend="Colours of this device" name="theme" value={theme} choices={THEMES} onChange={choose} height={44} />
    </div>
  );
}

function themeOfPage(): Theme {
  const set = document.documentElement.dataset.theme;
  return set === "light" || set === "dark" ? set : "system";
}
