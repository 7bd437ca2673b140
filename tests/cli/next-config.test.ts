import { expect, test, vi } from "vitest";

test("the tests' build goes to a folder of its own, so that a running product keeps its files", async () => {
  vi.stubEnv("NEXT_DIST_DIR", ".data/test/next");
  const { default: config } = await import("@/next.config.mjs");
  expect(config.distDir).toBe(".data/test/next");
  vi.unstubAllEnvs();
});
