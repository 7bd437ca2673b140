import { mkdirSync, rmSync } from "node:fs";
import { AxeBuilder } from "@axe-core/playwright";
import type { Browser, BrowserContext, Page } from "@playwright/test";
import { launchBrowser, signInState } from "@/lib/cli/demo-browser";
import { OPEN_SHEET, SHOT_ROLES, type ShotRole } from "@/lib/cli/shots-pages";

const SIZES = [
  { name: "phone", viewport: { width: 360, height: 740 } },
  { name: "desk", viewport: { width: 1440, height: 900 } },
] as const;
const THEMES = ["light", "dark"] as const;
const FOLDER = "shots";

// Signs in to a running demo as every role and writes a picture of every page, on a phone and a desk, light and dark. Says which pages
// axe finds fault with, which are wider than the screen, and which log an error.  npm run shots [-- ADDRESS [ROLE]]
async function main(): Promise<void> {
  const base = process.argv[2] ?? "http://127.0.0.1:4200";
  const only = process.argv[3];
  if (!only) rmSync(FOLDER, { recursive: true, force: true });
  mkdirSync(FOLDER, { recursive: true });
  const browser = await launchBrowser();
  let faults = 0;
  try {
    for (const role of SHOT_ROLES) if (!only || role.role === only) faults += await shootRole(browser, base, role);
  } finally {
    await browser.close();
  }
  console.log(faults === 0 ? "No faults found." : `${faults} faults found.`);
  process.exit(faults === 0 ? 0 : 1);
}

async function shootRole(browser: Browser, base: string, role: ShotRole): Promise<number> {
  let faults = 0;
  const state = role.email ? await signInState(browser, base, role.email) : undefined;
  for (const { name: size, viewport } of SIZES) {
    for (const theme of THEMES) {
      const context = await browser.newContext({ baseURL: base, viewport, colorScheme: theme, reducedMotion: "reduce", hasTouch: size === "phone", ...(state ? { storageState: state } : {}) });
      for (const page of role.pages) faults += await shoot(context, page, `${FOLDER}/${role.role}-${page.name}-${size}-${theme}.png`, theme === "light" || size === "desk");
      await context.close();
    }
  }
  return faults;
}

async function shoot(context: BrowserContext, { name, path }: { name: string; path: string }, file: string, withAxe: boolean): Promise<number> {
  const page = await context.newPage();
  const faults: string[] = [];
  page.on("console", (message) => message.type() === "error" && faults.push(`console: ${message.text().slice(0, 200)}`));
  page.on("pageerror", (error) => faults.push(`error: ${error.message.slice(0, 200)}`));
  const response = await page.goto(await resolve(page, path), { waitUntil: "load" });
  if (!response?.ok()) faults.push(`status ${response?.status()}`);
  await page.waitForTimeout(400);
  await page.screenshot({ path: file });
  const tooWide = await page.evaluate(() => document.documentElement.scrollWidth > document.documentElement.clientWidth + 1);
  if (tooWide) faults.push("wider than the screen");
  if (withAxe) {
    const { violations } = await new AxeBuilder({ page }).analyze();
    faults.push(...violations.map((violation) => `axe ${violation.id}: ${violation.nodes[0]?.target.join(" ")} (${violation.nodes.length})`));
  }
  await page.close();
  for (const fault of faults) console.log(`${file.replace(/^.*\//, "")} [${name}] ${fault}`);
  return faults.length;
}

/** Addresses of things that have no fixed id in the demo. */
async function resolve(page: Page, path: string): Promise<string> {
  if (path.endsWith("/:open")) {
    const origin = new URL(page.context().pages()[0]?.url() || "http://x").origin;
    await page.goto(path.replace("/:open", ""));
    const body = { ...OPEN_SHEET, idempotencyKey: crypto.randomUUID() };
    const answer = await page.evaluate(async (sent) => {
      const response = await fetch("/api/v1/orgs/merrowdale/observations", { method: "POST", body: JSON.stringify(sent), headers: { "content-type": "application/json" } });
      return (await response.json()) as { observationId?: string; detail?: string };
    }, body);
    if (!answer.observationId) throw new Error(`No sheet could be opened at ${origin}: ${answer.detail}`);
    return path.replace(":open", answer.observationId);
  }
  if (path.endsWith("/:newest")) {
    await page.goto(path.replace("/:newest", ""));
    return (await page.locator("tbody a").first().getAttribute("href")) ?? path;
  }
  return path;
}

main().catch((error: unknown) => {
  console.error(error instanceof Error ? error.message : error);
  process.exit(1);
});
