import type { Letter } from "@/lib/core/letters/letter";

/** Tells an apprentice that a module is theirs to learn. `dueOn` as it is shown to people. */
export function moduleGivenLetter(of: {
  to: string;
  name: string;
  moduleTitle: string;
  number: number;
  givenBy: string;
  workshop: string;
  dueOn: string;
  address: string;
}): Letter {
  return {
    to: of.to,
    subject: `To learn by ${of.dueOn}: ${of.moduleTitle}`,
    paragraphs: [
      `Hello ${of.name},`,
      `${of.givenBy} at ${of.workshop} has given you “${of.moduleTitle}” (revision ${of.number}). Know it by ${of.dueOn}.`,
      `Watch it step by step, answer what it asks, and go back where you were wrong. It is here:\n${of.address}`,
    ],
  };
}
