import { getDb } from "@/db/client";
import { findAssignment, listLatestRight } from "@/db/queries/learning";
import { listTaskTitles } from "@/db/reads/learning";
import type { ModuleStep } from "@/lib/core/modules/types";
import type { Actor } from "@/lib/core/roles";
import { cuePlainText } from "@/lib/core/webvtt/cue-text";
import { readVtt } from "@/lib/core/webvtt/read-vtt";
import type { LearningProgress } from "@/lib/schemas/assignments";
import type { Media } from "@/lib/schemas/media";
import { learningProgress } from "@/lib/services/learning/learning-progress";
import { myAssignment } from "@/lib/services/learning/my-assignment";
import { viewMedia } from "@/lib/services/learning/view-media";

export type Caption = { startMs: number; endMs: number; text: string };

/** Everything that the page of one given module shows. Of a question only when it comes and whether it was answered right. */
export type LearningView = {
  assignmentId: string;
  title: string;
  summary: string;
  number: number;
  dueOn: string;
  steps: ModuleStep[];
  questions: { id: string; stepId: string; recordingId: string; atMs: number; right: boolean }[];
  progress: LearningProgress;
  media: (Omit<Media, "captions"> & { captions: Caption[] })[];
  tasks: { id: string; title: string }[];
};

/** @throws AppError("not_found" | "forbidden" | "gone") */
export async function viewLearning(actor: Actor, assignmentId: string): Promise<LearningView> {
  const db = getDb();
  const assignment = myAssignment(actor, await findAssignment(db, actor.organisation.id, assignmentId));
  const { content } = assignment;
  const latest = await listLatestRight(db, assignmentId);
  const recordingOf = new Map(content.steps.map((step) => [step.id, step.recordingId]));
  const { media } = await viewMedia(actor, assignmentId);
  return {
    assignmentId,
    title: content.title,
    summary: content.summary,
    number: assignment.number,
    dueOn: assignment.dueOn,
    steps: content.steps,
    questions: content.questions.map(({ id, stepId, atMs }) => ({
      id,
      stepId,
      recordingId: recordingOf.get(stepId) ?? "",
      atMs,
      right: latest.get(id) === true,
    })),
    progress: await learningProgress(db, assignment),
    media: media.map(({ captions, ...files }) => ({ ...files, captions: captions[0] ? toCaptions(captions[0].vtt) : [] })),
    tasks: await listTaskTitles(db, content.taskIds),
  };
}

/** Parsed here, so that no parser is sent to the browser. */
function toCaptions(vtt: string): Caption[] {
  return readVtt(vtt).cues.map(({ startMs, endMs, text }) => ({ startMs, endMs, text: cuePlainText(text) }));
}
