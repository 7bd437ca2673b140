import { execFileSync } from "node:child_process";
import { mkdtempSync, readFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { expect, type Browser, type BrowserContext, type Page } from "@playwright/test";
import knex, { type Knex } from "knex";
import { DEMO_PASSWORD } from "@/db/seeds/demo/cast";

export const PHONE = { viewport: { width: 390, height: 844 }, hasTouch: true } as const;
export const DESK = { viewport: { width: 1440, height: 900 } } as const;

const folder = mkdtempSync(join(tmpdir(), "witnessline-e2e-"));
const ffmpeg = (...args: string[]) => execFileSync("ffmpeg", ["-hide_banner", "-loglevel", "error", "-y", ...args]);

/** A real film, made on the spot: H.264 with sound. @returns its path */
export function makeFilm(name: string, seconds: number): string {
  const file = join(folder, name);
  ffmpeg(
    ...["-f", "lavfi", "-i", `testsrc2=size=640x360:rate=25:duration=${seconds}`, "-f", "lavfi", "-i", `sine=frequency=440:duration=${seconds}`],
    ...["-c:v", "libx264", "-preset", "ultrafast", "-pix_fmt", "yuv420p", "-c:a", "aac", file],
  );
  return file;
}

/** A real photo. @returns its path */
export function makePhoto(name: string): string {
  const file = join(folder, name);
  ffmpeg("-f", "lavfi", "-i", `testsrc2=size=800x600:rate=1:duration=1`, "-frames:v", "1", file);
  return file;
}

export const inFolder = (name: string): string => join(folder, name);
export const read = (path: string): string => readFileSync(path, "utf8");

/** Signs in by the form, as a person does. */
export async function signIn(browser: Browser, email: string, options: Parameters<Browser["newContext"]>[0] = DESK): Promise<{ context: BrowserContext; page: Page }> {
  const context = await browser.newContext(options);
  const page = await context.newPage();
  await page.goto("/sign-in");
  await page.getByLabel("E-mail address").fill(email);
  await page.getByLabel("Password", { exact: true }).fill(DEMO_PASSWORD);
  await page.getByRole("button", { name: "Sign in", exact: true }).click();
  await expect(page).not.toHaveURL(/\/sign-in/);
  return { context, page };
}

/** Rows as the owner sees them; ended by the caller. */
export function ownerDb(): Knex {
  const url = process.env.MIGRATION_DATABASE_URL;
  if (!url) throw new Error("Set MIGRATION_DATABASE_URL to the tested installation's database.");
  return knex({ client: "pg", connection: url, pool: { min: 0, max: 2 } });
}

/** Waits for a letter that the product sent, at the mail sink. */
export async function letterTo(email: string, subject: RegExp): Promise<string> {
  const address = `${process.env.MAIL_SINK_URL}/messages.json?to=${encodeURIComponent(email)}`;
  let found: { subject: string; text: string } | undefined;
  await expect
    .poll(
      async () => {
        const letters = (await (await fetch(address)).json()) as { subject: string; text: string }[];
        found = letters.find((letter) => subject.test(letter.subject));
        return found?.subject ?? "";
      },
      { timeout: 30_000 },
    )
    .toMatch(subject);
  return found?.text ?? "";
}
