import { parseArgs } from "node:util";
import { z } from "zod";
import { runKeeperCommand } from "@/lib/cli/keeper-command";
import { ORGANISATION_KINDS } from "@/lib/core/roles";
import { emailSchema, personNameSchema } from "@/lib/schemas/accounts";
import { inviteFirstManager } from "@/lib/services/people/invite-first-manager";

const USAGE = `Founds an organisation and prints a single-use link for its first manager:
  npm run first-manager -- --organisation "Quay Garage" --kind workshop --slug quay --name "Ana Example" --email ana@example.org`;

const wordsSchema = z.object({
  organisation: z.string().trim().min(1).max(120),
  kind: z.enum(ORGANISATION_KINDS),
  slug: z.string().regex(/^[a-z0-9][a-z0-9-]{1,38}$/, "use 2 to 39 small letters, digits and hyphens"),
  name: personNameSchema,
  email: emailSchema,
});

void runKeeperCommand(USAGE, async () => {
  const option = { type: "string" } as const;
  const { values } = parseArgs({ options: { organisation: option, kind: option, slug: option, name: option, email: option } });
  const words = wordsSchema.parse(values);
  const { link, days } = await inviteFirstManager(words);
  return `${words.organisation} stands. ${words.name} becomes its manager by this link, which works once and holds for ${days} days:\n\n  ${link}\n`;
});
