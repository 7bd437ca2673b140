import type { NewEntry } from "@/lib/core/ledger/entry";
import type { CriterionMark, Level, Outcome } from "@/lib/core/tasks/types";

type SignedSheet = {
  observationId: string;
  taskId: string;
  taskRevision: number;
  taskContentHash: string;
  outcome: Outcome;
  level: Level | null;
  stoppedForSafety: boolean;
  marks: CriterionMark[];
  startedAt: string;
  apprentice: { personId: string; name: string };
  assessor: { personId: string; name: string };
  vehicle: string;
  jobCardNumber: string;
  feedback: string;
};

/** What a sign-off records. Names, vehicle, job card, remarks and feedback are personal; marks and readings are not. */
export function signOffEntry(sheet: SignedSheet): NewEntry {
  const { apprentice, assessor, vehicle, jobCardNumber, feedback, marks, ...rest } = sheet;
  const about = (label: string, value: string) => (value === "" ? [] : [{ personId: apprentice.personId, label, value }]);
  return {
    kind: "sign_off",
    subject: { ...rest, marks: marks.map(({ key, mark, reading, prompts }) => ({ key, mark, reading, prompts })) },
    personal: [
      ...about("apprentice", apprentice.name),
      { personId: assessor.personId, label: "assessor", value: assessor.name },
      ...about("vehicle", vehicle),
      ...about("job_card", jobCardNumber),
      ...about("feedback", feedback),
      ...marks.flatMap((mark) => about(`remark:${mark.key}`, mark.remark)),
    ],
  };
}
