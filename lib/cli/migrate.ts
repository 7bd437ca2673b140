import { migrate } from "@/db/migrate";

// Brings a database to today's shape:  MIGRATION_DATABASE_URL=… DATABASE_URL=… node --import tsx lib/cli/migrate.ts
async function main(): Promise<void> {
  const { MIGRATION_DATABASE_URL: ownerUrl, DATABASE_URL: appUrl } = process.env;
  if (!ownerUrl || !appUrl) {
    throw new Error("Set MIGRATION_DATABASE_URL (the role that owns the database) and DATABASE_URL (the application's role).");
  }
  const ran = await migrate(ownerUrl, decodeURIComponent(new URL(appUrl).username));
  for (const name of ran) console.log(name);
  console.log(ran.length === 0 ? "nothing to do" : `${ran.length} migrations ran`);
}

main().catch((error: unknown) => {
  console.error(error instanceof Error ? error.message : error);
  process.exit(1);
});
