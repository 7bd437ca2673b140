import { dirname, join } from "node:path";
import { fileURLToPath } from "node:url";
import { removeCluster, startCluster } from "./cluster.mjs";
import { runCommand } from "./told.mjs";

// A PostgreSQL for single tests while working, left running in the background:  eval "$(node lib/cli/dev-cluster.mjs)"
// `--stop` stops and removes it.
const dataFolder = join(dirname(fileURLToPath(import.meta.url)), "../../.data/dev-cluster");

await runCommand(async () => {
  if (process.argv.includes("--stop")) return removeCluster(dataFolder);
  const cluster = await startCluster({ dataFolder, usualPort: 4295, forTests: true });
  console.log(`export TEST_DATABASE_ADMIN_URL='${cluster.adminUrl}'`);
  console.log(`export TEST_OWNER_URL='${cluster.ownerUrl("postgres")}'`);
  console.log(`export TEST_APP_URL='${cluster.appUrl("postgres")}'`);
});
