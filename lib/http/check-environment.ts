import { env } from "@/lib/env";

/** Ends the server at once, with every variable that is missing or wrong, rather than at the first request that needs one. */
export function checkEnvironment(): void {
  try {
    env();
  } catch (error) {
    console.error(error instanceof Error ? error.message : error);
    process.exit(1);
  }
}
