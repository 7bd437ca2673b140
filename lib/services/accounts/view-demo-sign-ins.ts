import { readFile } from "node:fs/promises";
import { join } from "node:path";
import { z } from "zod";
import { env } from "@/lib/env";
import { demoSignInSchema, type DemoSignIn } from "@/lib/schemas/accounts";

export type Demonstration = { signIns: DemoSignIn[]; mailSinkUrl: string | null };

/** In a demonstration, and only there, one sign-in per role with its password, and where the letters go. Undefined anywhere else. */
export async function viewDemoSignIns(): Promise<Demonstration | undefined> {
  const { DEMO, MAIL_SINK_URL } = env();
  if (!DEMO) return undefined;
  const text = await readFile(join(process.cwd(), "db/seeds/demo/sign-ins.json"), "utf8").catch(() => "[]");
  return { signIns: z.array(demoSignInSchema).parse(JSON.parse(text)), mailSinkUrl: MAIL_SINK_URL ?? null };
}
