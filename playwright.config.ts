import { defineConfig } from "@playwright/test";

// `npm test -- browser` starts the servers and gives their addresses; nothing is started from here.
export default defineConfig({
  testDir: "tests/e2e",
  outputDir: "test-results",
  timeout: 180_000,
  retries: process.env.CI ? 1 : 0,
  workers: 1, // a transcoder runs beside the browser, and two cores are all there is
  forbidOnly: Boolean(process.env.CI),
  use: {
    baseURL: process.env.E2E_BASE_URL ?? "http://127.0.0.1:4200",
    actionTimeout: 20_000,
    trace: "retain-on-failure",
    launchOptions: {
      executablePath: process.env.CHROMIUM ?? "/usr/bin/chromium",
      // Chromium's own sandbox refuses root, which is what a build machine's container runs as.
      args: ["--disable-gpu", "--disable-background-networking", ...(process.getuid?.() === 0 ? ["--no-sandbox"] : [])],
    },
  },
});
