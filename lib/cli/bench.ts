import type { BrowserContext } from "@playwright/test";
import { launchBrowser, signInState } from "@/lib/cli/demo-browser";
import { SHOT_ROLES } from "@/lib/cli/shots-pages";

/** Gzip bytes of script that a page may load beyond an empty page of the same build; more where films are played and marked out. */
const GOAL_KB = 60;
const FILM_GOAL_KB = 190;
const FILM_PAGES = ["learn-module", "bench"];
/** What is loaded late, such as the player, counts too. */
const SETTLE_MS = 2500;

// Figures of a running demo that was built for production:  npm run bench [-- ADDRESS]
// Each line is `figure NAME VALUE GOAL ok` or `… short`.
async function main(): Promise<void> {
  const base = process.argv[2] ?? "http://127.0.0.1:4200";
  const browser = await launchBrowser();
  let short = 0;
  try {
    for (const role of SHOT_ROLES) {
      const state = role.email ? await signInState(browser, base, role.email) : undefined;
      const context = await browser.newContext({ baseURL: base, ...(state ? { storageState: state } : {}) });
      const empty = await scriptBytes(context, "/there-is-no-such-page");
      for (const { name, path } of role.pages.filter((page) => !page.path.includes("/:"))) {
        const value = Math.round((await scriptBytes(context, path)) / 1024 - empty / 1024);
        const goal = FILM_PAGES.includes(name) ? FILM_GOAL_KB : GOAL_KB;
        short += value <= goal ? 0 : 1;
        console.log(`figure js-${role.role}-${name} ${value}KB <=${goal}KB ${value <= goal ? "ok" : "short"}`);
      }
      await context.close();
    }
  } finally {
    await browser.close();
  }
  process.exit(short === 0 ? 0 : 1);
}

/** Bytes of script that came over the line for one page, as they were sent (gzip), nothing from a cache. */
async function scriptBytes(context: BrowserContext, path: string): Promise<number> {
  const page = await context.newPage();
  const session = await context.newCDPSession(page);
  await session.send("Network.enable");
  await session.send("Network.setCacheDisabled", { cacheDisabled: true });
  const scripts = new Set<string>();
  let bytes = 0;
  session.on("Network.responseReceived", (event) => void (event.type === "Script" && scripts.add(event.requestId)));
  session.on("Network.loadingFinished", (event) => {
    if (scripts.has(event.requestId)) bytes += event.encodedDataLength;
  });
  await page.goto(path);
  await page.waitForTimeout(SETTLE_MS);
  await page.close();
  return bytes;
}

main().catch((error: unknown) => {
  console.error(error instanceof Error ? error.message : error);
  process.exit(1);
});
