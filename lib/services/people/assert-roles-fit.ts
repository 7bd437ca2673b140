import { AppError } from "@/lib/core/errors";
import { roleLabel, ROLES_OF_KIND, type OrganisationKind, type Role } from "@/lib/core/roles";

/**
 * A workshop has no verifier and a college no mentor.
 * @throws AppError("invalid_input")
 */
export function assertRolesFit(roles: readonly Role[], kind: OrganisationKind): void {
  const foreign = roles.find((role) => !ROLES_OF_KIND[kind].includes(role));
  if (!foreign) return;
  const message = `A ${kind} has no ${roleLabel(foreign, kind)}.`;
  throw new AppError("invalid_input", message, [{ path: "roles", message }]);
}
