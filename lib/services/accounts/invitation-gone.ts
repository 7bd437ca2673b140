import type { InvitationState } from "@/db/queries/invitations";
import { AppError } from "@/lib/core/errors";

const GONE: Record<Exclude<InvitationState, "open"> | "unknown", string> = {
  accepted: "This link was used already, and it works once. If it was you, sign in.",
  withdrawn: "This invitation was withdrawn. If you think that is a mistake, ask whoever invited you.",
  expired: "This link has expired: it holds for seven days. Ask whoever invited you to send it again.",
  unknown: "This link is not valid. If you were sent a newer letter, use the link in that one; otherwise ask to be invited again.",
};

/** The refusal of a link that can't be used any more: why, and what to do. */
export function invitationGone(state: Exclude<InvitationState, "open"> | "unknown"): AppError {
  return new AppError("gone", GONE[state]);
}
