import type { Role } from "@/lib/core/roles";

/** Somebody who belongs to the organisation, as the people page shows them. */
export type Member = { personId: string; name: string; email: string; roles: Role[]; joinedOn: string; suspended: boolean; you: boolean };
