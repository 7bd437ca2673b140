export const ROLES = ["mentor", "apprentice", "assessor", "liaison", "manager", "verifier"] as const;
export type Role = (typeof ROLES)[number];

export const ORGANISATION_KINDS = ["workshop", "college"] as const;
export type OrganisationKind = (typeof ORGANISATION_KINDS)[number];

/** Which roles a kind of organisation can give (product: "People"). */
export const ROLES_OF_KIND: Record<OrganisationKind, readonly Role[]> = {
  workshop: ["mentor", "apprentice", "assessor", "manager"],
  college: ["apprentice", "assessor", "liaison", "verifier", "manager"],
};

export const ROLE_LABEL: Record<Role, string> = {
  mentor: "mentor",
  apprentice: "apprentice",
  assessor: "assessor",
  liaison: "college liaison",
  manager: "workshop manager",
  verifier: "verifier",
};

/** What a role is called at a kind of organisation: a college has a manager too. */
export function roleLabel(role: Role, kind: OrganisationKind): string {
  return role === "manager" ? `${kind} manager` : ROLE_LABEL[role];
}

/** A signed-in person, not yet at an organisation. */
export type SignedIn = { personId: string; name: string; email: string; sessionId: string };

/** A signed-in person as a member of the organisation in the address. */
export type Actor = SignedIn & {
  organisation: { id: string; slug: string; name: string; kind: OrganisationKind; isDemo: boolean };
  roles: ReadonlySet<Role>;
};
