import { z } from "zod";
import { ROLES } from "@/lib/core/roles";
import { emailSchema, personNameSchema } from "@/lib/schemas/accounts";

/** At least one role, each once, in the order in which roles are always shown. */
export const rolesSchema = z
  .array(z.enum(ROLES))
  .min(1, "Choose at least one role.")
  .transform((roles) => ROLES.filter((role) => roles.includes(role)));

export const invitePersonSchema = z.object({ name: personNameSchema, email: emailSchema, roles: rolesSchema });
export type InvitePersonInput = z.infer<typeof invitePersonSchema>;

export const changeRolesSchema = z.object({ roles: rolesSchema });
