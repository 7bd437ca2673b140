import type { Letter } from "@/lib/core/letters/letter";

/** The single-use link to set a new password. */
export function passwordResetLetter(of: { to: string; name: string; address: string; minutes: number }): Letter {
  return {
    to: of.to,
    subject: "Set a new password",
    paragraphs: [
      `Hello ${of.name},`,
      `Somebody, you we hope, asked for a new password for this address. Set it here; the link works once, for ${of.minutes} minutes:\n${of.address}`,
      `You will then be signed out everywhere. If it was not you, do nothing: your password stays as it is.`,
    ],
  };
}

/** Tells the person that their password is another one now, in case it was not them. */
export function passwordChangedLetter(of: { to: string; name: string; address: string }): Letter {
  return {
    to: of.to,
    subject: "Your password was changed",
    paragraphs: [
      `Hello ${of.name},`,
      `The password for this address was changed just now, and other devices were signed out.`,
      `If it was not you, set a new one at once, and tell your manager:\n${of.address}`,
    ],
  };
}
