import { z } from "zod";
import { getDb } from "@/db/client";
import { AppError } from "@/lib/core/errors";

/**
 * Runs a command of the installation's keeper: says what was done, or in a sentence why not and how it is called. Needs the environment
 * that the application has; the owner's database address will do where the application's is not at hand.
 */
export async function runKeeperCommand(usage: string, run: () => Promise<string>): Promise<void> {
  const { MIGRATION_DATABASE_URL: ownerUrl } = process.env;
  if (ownerUrl) process.env.DATABASE_URL ??= ownerUrl;
  try {
    console.log(await run());
    await getDb().destroy();
  } catch (error) {
    console.error(sentenceOf(error, usage));
    process.exit(1);
  }
}

function sentenceOf(error: unknown, usage: string): string {
  if (error instanceof AppError) return `${error.message}\n\n${usage}`;
  if (error instanceof z.ZodError) return `${error.issues.map((issue) => `--${issue.path.join(".")}: ${issue.message}`).join("\n")}\n\n${usage}`;
  if (error instanceof TypeError && "code" in error && String(error.code).startsWith("ERR_PARSE_ARGS")) return `${error.message}\n\n${usage}`;
  return error instanceof Error ? error.message : String(error);
}
