import { randomUUID } from "node:crypto";
import { getDb } from "@/db/client";
import { listQuestions, listSteps } from "@/db/queries/marking";
import { assertAllowed } from "@/lib/core/decision";
import { AppError } from "@/lib/core/errors";
import type { Question } from "@/lib/core/questions/types";
import type { Actor } from "@/lib/core/roles";
import { NO_FACTS, type Step, type StepFacts } from "@/lib/core/steps/types";
import { readChapters } from "@/lib/core/webvtt/chapters";
import { readMarkingTrack, type MarkingCue } from "@/lib/core/webvtt/marking-track";
import type { LineProblem } from "@/lib/core/webvtt/read-vtt";
import { canMarkOut } from "@/lib/policies/marking";
import type { ImportMarkingInput } from "@/lib/schemas/marking";
import { questionSchema } from "@/lib/schemas/questions";
import { stepFactsSchema } from "@/lib/schemas/steps";
import { lockForMarking, writeMarking } from "@/lib/services/marking/save-marking";
import type { Marking } from "@/lib/services/marking/view-marking";
import { z } from "zod";

/**
 * Replaces the marking out by what WebVTT files say. Either both files are taken or neither; every problem has its line.
 * @throws AppError("forbidden" | "not_found" | "conflict" | "invalid_input" with line numbers)
 */
export async function importMarking(actor: Actor, recordingId: string, input: ImportMarkingInput): Promise<Marking> {
  assertAllowed(canMarkOut(actor));
  return getDb().transaction(async (trx) => {
    const recording = await lockForMarking(trx, actor, recordingId, input.version);
    const durationMs = recording.durationMs ?? 0;
    const chapters = readChapters(input.chapters, durationMs);
    if ("problems" in chapters) throw refused("steps", chapters.problems);

    const before = new Map((await listSteps(trx, recordingId)).map((step) => [step.id, step.facts]));
    // A file written elsewhere has ids of its own or none: those steps are new.
    const steps: Step[] = chapters.chapters.map((chapter) => ({ ...chapter, id: z.uuid().safeParse(chapter.id).success ? chapter.id : randomUUID(), facts: NO_FACTS }));
    const marking =
      input.marking === null
        ? { facts: before, questions: (await listQuestions(trx, recordingId)).filter((question) => steps.some((step) => step.id === question.stepId)) }
        : readMarking(input.marking, durationMs);
    const withFacts = steps.map((step) => ({ ...step, facts: marking.facts.get(step.id) ?? NO_FACTS }));
    const version = await writeMarking(trx, actor, recording, { steps: withFacts, questions: marking.questions });
    return { version, steps: withFacts, questions: marking.questions };
  });
}

function readMarking(text: string, durationMs: number): { facts: Map<string, StepFacts>; questions: Question[] } {
  const track = readMarkingTrack(text, durationMs);
  if ("problems" in track) throw refused("facts and questions", track.problems);
  const facts = new Map<string, StepFacts>();
  const questions: Question[] = [];
  const problems: LineProblem[] = [];
  for (const cue of track.cues) {
    const read = readCue(cue);
    if ("problem" in read) problems.push(read.problem);
    else if (read.kind === "facts") facts.set(read.stepId, read.facts);
    else questions.push(read.question);
  }
  if (problems.length > 0) throw refused("facts and questions", problems);
  return { facts, questions };
}

const factsCueSchema = z.object({ kind: z.literal("facts"), stepId: z.uuid(), facts: stepFactsSchema });
const questionCueSchema = questionSchema.omit({ id: true, atMs: true }).extend({ kind: z.literal("question") });

type ReadCue = { kind: "facts"; stepId: string; facts: StepFacts } | { kind: "question"; question: Question } | { problem: LineProblem };

function readCue({ line, id, startMs, json }: MarkingCue): ReadCue {
  const facts = factsCueSchema.safeParse(json);
  if (facts.success) return facts.data;
  const question = questionCueSchema.safeParse(json);
  if (question.success) {
    const { kind: _, ...rest } = question.data;
    return { kind: "question", question: { ...rest, id: z.uuid().safeParse(id).success ? id : randomUUID(), atMs: startMs } };
  }
  const isQuestion = (json as { kind?: unknown } | null)?.kind === "question";
  const issue = (isQuestion ? question.error : facts.error).issues[0];
  return { problem: { line: line + 1, message: `${isQuestion ? "Question" : "Facts"}: ${issue?.path.join(".") ?? ""} ${issue?.message ?? "not understood"}` } };
}

const refused = (file: string, problems: LineProblem[]): AppError =>
  new AppError(
    "invalid_input",
    `The file of ${file} was refused; nothing was changed.`,
    problems.map(({ line, message }) => ({ path: `line ${line}`, message })),
  );
