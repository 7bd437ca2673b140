import { z } from "zod";
import {
  acceptInvitationSchema,
  changePasswordSchema,
  emailSchema,
  invitationViewSchema,
  setPasswordSchema,
  tokenSchema,
} from "@/lib/schemas/accounts";
import type { DoorSpec } from "@/lib/schemas/contract/door-spec";

/** Doors of the API itself and of a person's own account. Single-use tokens come in the body, never in an address. */
export const accountsDoors = {
  "GET /openapi.json": {
    summary: "This document",
    roles: "anyone",
    response: { file: "application/json" },
  },
  "POST /invitations/look": {
    summary: "What an invitation's link invites to, and what is needed to accept it",
    roles: "anyone",
    body: z.object({ token: tokenSchema }),
    response: invitationViewSchema,
  },
  "POST /invitations/accept": {
    summary: "Accept an invitation, as the person signed in or as somebody new",
    roles: "anyone",
    body: acceptInvitationSchema,
    response: z.object({ org: z.string(), email: z.string() }),
  },
  "POST /password-resets": {
    summary: "Ask for a link to set a new password; the answer is the same whether the address is known or not",
    roles: "anyone",
    body: z.object({ email: emailSchema }),
    response: z.object({ asked: z.literal(true) }),
  },
  "POST /password-resets/use": {
    summary: "Set a new password with such a link; ends every session of the person",
    roles: "anyone",
    body: setPasswordSchema,
    response: z.object({ email: z.string() }),
  },
  "PUT /account/password": {
    summary: "Change one's own password; ends one's other sessions",
    roles: "signed_in",
    body: changePasswordSchema,
    response: z.object({ otherSessionsEnded: z.int() }),
  },
  "DELETE /account/sessions": {
    summary: "Sign out everywhere, here too",
    roles: "signed_in",
    response: z.object({ ended: z.int() }),
  },
  "DELETE /account/sessions/{sessionId}": {
    summary: "Sign out on one device",
    roles: "signed_in",
    params: z.object({ sessionId: z.uuid() }),
    response: z.object({ ended: z.literal(1) }),
  },
} as const satisfies Record<string, DoorSpec>;
