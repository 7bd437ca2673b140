import { fileURLToPath } from "node:url";
import { defineConfig } from "vitest/config";

const root = fileURLToPath(new URL(".", import.meta.url));

export default defineConfig({
  resolve: {
    alias: {
      "@": root.replace(/\/$/, ""),
      // `server-only` throws outside the framework; under test the server is us.
      "server-only": `${root}tests/support/server-only.ts`,
    },
  },
  test: {
    include: ["tests/**/*.test.{ts,tsx}"],
    testTimeout: 20_000,
    hookTimeout: 60_000,
  },
});
