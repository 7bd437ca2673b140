import { parseArgs } from "node:util";
import { AppError } from "@/lib/core/errors";
import { runKeeperCommand } from "@/lib/cli/keeper-command";
import { suspendPerson } from "@/lib/services/accounts/suspend-person";

const USAGE = `Shuts a person out of the whole installation, at once and on every device; --restore lets them back in:
  npm run suspend -- someone@example.org
  npm run suspend -- --restore someone@example.org`;

void runKeeperCommand(USAGE, async () => {
  const { values, positionals } = parseArgs({ options: { restore: { type: "boolean", default: false } }, allowPositionals: true });
  const [email, ...more] = positionals;
  if (!email || more.length > 0) throw new AppError("invalid_input", "Give one e-mail address.");
  const { name } = await suspendPerson(email, !values.restore);
  return values.restore ? `${name} may sign in again.` : `${name} is suspended and signed out everywhere.`;
});
