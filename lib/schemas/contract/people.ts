import { z } from "zod";
import type { DoorSpec } from "@/lib/schemas/contract/door-spec";
import { changeRolesSchema, invitePersonSchema } from "@/lib/schemas/people";

const memberParams = z.object({ org: z.string(), personId: z.uuid() });
const invitationParams = z.object({ org: z.string(), invitationId: z.uuid() });
const sent = z.object({ invitationId: z.uuid() });

/** Doors of people: who belongs to an organisation, and who is asked to. */
export const peopleDoors = {
  "POST /orgs/{org}/invitations": {
    summary: "Invite somebody by mail",
    roles: ["manager"],
    params: z.object({ org: z.string() }),
    body: invitePersonSchema,
    response: sent,
  },
  "DELETE /orgs/{org}/invitations/{invitationId}": {
    summary: "Withdraw an invitation; its link stops working",
    roles: ["manager"],
    params: invitationParams,
    response: sent,
  },
  "POST /orgs/{org}/invitations/{invitationId}/letters": {
    summary: "Send an invitation again with a new link; the old one stops working",
    roles: ["manager"],
    params: invitationParams,
    response: sent,
  },
  "PUT /orgs/{org}/people/{personId}/roles": {
    summary: "Say what somebody is at this organisation",
    roles: ["manager"],
    params: memberParams,
    body: changeRolesSchema,
    response: changeRolesSchema,
  },
  "DELETE /orgs/{org}/people/{personId}": {
    summary: "End somebody's membership; works at once, the record stays",
    roles: ["manager"],
    params: memberParams,
    response: z.object({ personId: z.uuid() }),
  },
} as const satisfies Record<string, DoorSpec>;
