import { chromium, type Browser, type BrowserContext } from "@playwright/test";
import { DEMO_PASSWORD } from "@/db/seeds/demo/cast";

/** The browser that Debian brings; nothing is downloaded. */
export function launchBrowser(): Promise<Browser> {
  return chromium.launch({ executablePath: "/usr/bin/chromium", args: ["--no-sandbox", "--disable-gpu", "--disable-background-networking"] });
}

/** Signs in to a running demo by its form. @returns what another context needs to be signed in too */
export async function signInState(browser: Browser, base: string, email: string): Promise<Awaited<ReturnType<BrowserContext["storageState"]>>> {
  const context = await browser.newContext({ baseURL: base });
  const page = await context.newPage();
  await page.goto("/sign-in");
  await page.getByLabel("E-mail address").fill(email);
  await page.getByLabel("Password", { exact: true }).fill(DEMO_PASSWORD);
  await page.getByRole("button", { name: "Sign in", exact: true }).click();
  await page.waitForURL((url) => !url.pathname.startsWith("/sign-in"));
  const state = await context.storageState();
  await context.close();
  return state;
}
