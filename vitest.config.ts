import { fileURLToPath } from "node:url";
import { defineConfig } from "vitest/config";

const root = fileURLToPath(new URL(".", import.meta.url));

export default defineConfig({
  resolve: {
    alias: {
      // `server-only` throws outside the framework; under test the server is us.
      "server-only": `${root}tests/support/server-only.ts`,
      "@": root.replace(/\/$/, ""),
    },
  },
  test: {
    include: ["tests/**/*.test.{ts,tsx}"],
    setupFiles: ["tests/support/environment.ts"],
    testTimeout: 20_000,
    hookTimeout: 60_000,
  },
});
