import type { Letter } from "@/lib/core/letters/letter";
import type { Outcome } from "@/lib/core/tasks/types";

type Signed = {
  to: string;
  name: string;
  apprentice: string;
  task: string;
  outcome: Outcome;
  levelText: string;
  reasons: string[];
  feedback: string;
  assessor: string;
  address: string;
};

const SAFETY =
  "A sign-off says what was seen on that day. It is not a release of the vehicle, and the maker's data and local rules come first.";

const decision = (of: Signed): string =>
  of.outcome === "met" ? `Met, supervision level ${of.levelText}.` : `Not yet. What is missing:\n${of.reasons.map((reason) => `- ${reason}`).join("\n")}`;

/** Tells the apprentice what was decided, why, and what the assessor said. */
export function signedOffLetter(of: Signed): Letter {
  return {
    to: of.to,
    subject: `${of.task}: ${of.outcome === "met" ? "signed off" : "not yet"}`,
    paragraphs: [
      `Hello ${of.name},`,
      `${of.assessor} has signed the observation of your work on “${of.task}”.\n${decision(of)}`,
      ...(of.feedback ? [`${of.assessor} writes: ${of.feedback}`] : []),
      `The whole sheet is here:\n${of.address}`,
      SAFETY,
    ],
  };
}

/** The same for a mentor of the apprentice. */
export function signedOffMentorLetter(of: Signed): Letter {
  return {
    to: of.to,
    subject: `${of.apprentice}, ${of.task}: ${of.outcome === "met" ? "signed off" : "not yet"}`,
    paragraphs: [
      `Hello ${of.name},`,
      `${of.assessor} has observed ${of.apprentice} on “${of.task}”.\n${decision(of)}`,
      `The sheet is here:\n${of.address}`,
      SAFETY,
    ],
  };
}
