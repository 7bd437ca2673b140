import { door } from "@/lib/http/door";
import { confirmPracticeRun } from "@/lib/services/practice/confirm-practice-run";

export const POST = door("POST /orgs/{org}/practice-runs/{practiceRunId}/confirmation", ({ actor, params }) =>
  confirmPracticeRun(actor, params.practiceRunId),
);
