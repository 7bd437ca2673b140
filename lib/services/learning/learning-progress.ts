import type { Knex } from "knex";
import type { Db } from "@/db/client";
import { listLatestRight, listPlayed, setKnowledgeMet, type Assignment } from "@/db/queries/learning";
import { seenShare } from "@/lib/core/coverage/spans";
import { knowledgeStanding } from "@/lib/core/modules/knowledge";
import type { LearningProgress } from "@/lib/schemas/assignments";

/** Where an apprentice stands in a module, from what the server accepted and marked. */
export async function learningProgress(db: Db, assignment: Assignment): Promise<LearningProgress> {
  const played = await listPlayed(db, assignment.id);
  const latest = await listLatestRight(db, assignment.id);
  const seen = new Map(assignment.content.steps.map((step) => [step.id, seenShare(played.get(step.recordingId) ?? [], step)]));
  return {
    knowledge: knowledgeStanding(assignment.content, latest, seen),
    seen: Object.fromEntries(seen),
    played: Object.fromEntries([...played].map(([id, spans]) => [id, spans.map(([start, end]): [number, number] => [start, end])])),
  };
}

/** The same after a change, noting once when the knowledge rule is met: from then on the task is open. */
export async function settleProgress(trx: Knex.Transaction, assignment: Assignment): Promise<LearningProgress> {
  const progress = await learningProgress(trx, assignment);
  if (progress.knowledge.met && !assignment.knowledgeMetAt) await setKnowledgeMet(trx, assignment.id);
  return progress;
}
