import nextCoreWebVitals from "eslint-config-next/core-web-vitals";
import nextTypescript from "eslint-config-next/typescript";

const config = [
  { ignores: [".next/", ".data/", "node_modules/", "next-env.d.ts", "test-results/", "playwright-report/", "shots/"] },
  ...nextCoreWebVitals,
  ...nextTypescript,
  {
    rules: {
      "@typescript-eslint/no-unused-vars": ["error", { argsIgnorePattern: "^_", varsIgnorePattern: "^_" }],
      "@typescript-eslint/no-explicit-any": "error",
      // A module is what an apprentice learns from; the word is ours before it is the bundler's.
      "@next/next/no-assign-module-variable": "off",
    },
  },
  {
    files: ["**/*.cjs"],
    rules: { "@typescript-eslint/no-require-imports": "off" },
  },
  {
    files: ["app/**", "components/**", "db/**", "storage/**", "lib/**"],
    ignores: ["lib/env.ts", "lib/cli/**", "storage/fake/main.ts"],
    rules: {
      "no-restricted-properties": [
        "error",
        { object: "process", property: "env", message: "lib/env.ts is the only reader of the environment; call env()." },
      ],
    },
  },
];

export default config;
