import type { Letter } from "@/lib/core/letters/letter";

/** Asks somebody to join an organisation. `address` is the single-use link; `until` and the roles as they are shown to people. */
export function invitationLetter(of: {
  to: string;
  name: string;
  organisation: string;
  roles: string;
  invitedBy: string;
  address: string;
  until: string;
}): Letter {
  return {
    to: of.to,
    subject: `Join ${of.organisation} on Witnessline`,
    paragraphs: [
      `Hello ${of.name},`,
      `${of.invitedBy} asks you to join ${of.organisation} as ${of.roles}. Witnessline is where its training and its sign-offs are kept.`,
      `Accept here; the link is yours alone, works once, and holds until ${of.until}:\n${of.address}`,
      `If you did not expect this, do nothing: without you nobody can use the link, and nothing is made in your name.`,
    ],
  };
}
