import { Checkbox } from "@/components/ui/field";
import type { Role } from "@/lib/core/roles";

export type RoleChoice = { role: Role; label: string };

const WHAT_FOR: Record<Role, string> = {
  mentor: "films jobs, marks them out, gives modules",
  apprentice: "learns, practises, is observed",
  assessor: "observes and signs off",
  liaison: "follows every apprentice’s progress",
  manager: "says who belongs here and sees who may do what",
  verifier: "samples assessors’ decisions",
};

/** What somebody may be at this kind of organisation; several at once. Sent as `roles`, once for each. */
export function RoleBoxes({ roles, chosen, error }: { roles: readonly RoleChoice[]; chosen: readonly Role[]; error?: string | undefined }) {
  return (
    <fieldset aria-describedby={error ? "roles-error" : undefined}>
      <legend className="font-plate text-[1.1rem] font-semibold">Roles</legend>
      {roles.map(({ role, label }) => (
        <Checkbox key={role} name="roles" value={role} defaultChecked={chosen.includes(role)} label={label} hint={WHAT_FOR[role]} />
      ))}
      {error && (
        <p id="roles-error" role="alert" className="text-sm font-semibold text-paint-text">
          {error}
        </p>
      )}
    </fieldset>
  );
}

/** The roles ticked in a form that was sent; the server judges whether they fit. */
export const chosenRoles = (form: FormData): Role[] => form.getAll("roles").map(String) as Role[];

/** The roles as words: "mentor, assessor". */
export const rolesInWords = (choices: readonly RoleChoice[], roles: readonly Role[]): string =>
  roles.map((role) => choices.find((choice) => choice.role === role)?.label ?? role).join(", ");
