import type { Config } from "tailwindcss";

/** The look's tokens. Their values, light and dark, are custom properties in app/globals.css; tests/components/contrast.test.ts measures them. */
const config: Config = {
  content: ["./app/**/*.{ts,tsx}", "./components/**/*.{ts,tsx}"],
  theme: {
    colors: {
      transparent: "transparent",
      current: "currentColor",
      enamel: "var(--enamel)",
      sheet: "var(--sheet)",
      chalk: "var(--chalk)",
      deep: "var(--deep)",
      "deep-ink": "var(--deep-ink)",
      "deep-soft": "var(--deep-soft)",
      "deep-line": "var(--deep-line)",
      ink: "var(--ink)",
      ink2: "var(--ink2)",
      strong: "var(--strong)",
      "strong-ink": "var(--strong-ink)",
      paint: "var(--paint)",
      "paint-ink": "var(--paint-ink)",
      "paint-text": "var(--paint-text)",
      line: "var(--line)",
      steel: "var(--steel)",
      rule: "var(--rule)",
      tint: "var(--tint)",
      caution: "var(--caution)",
      "caution-ink": "var(--caution-ink)",
      film: "var(--film)",
    },
    borderRadius: { none: "0", DEFAULT: "3px", full: "9999px" },
    fontFamily: {
      sans: ['"Atkinson Hyperlegible Next Variable"', "system-ui", "sans-serif"],
      plate: ['"Barlow Condensed"', '"Arial Narrow"', "sans-serif"],
      mono: ['"Atkinson Hyperlegible Mono Variable"', "ui-monospace", "monospace"],
    },
    boxShadow: {},
  },
};

export default config;
