import { z } from "zod";
import type { FieldProblem } from "@/lib/core/errors";
import { questionProblems } from "@/lib/core/questions/question-problems";
import type { Question } from "@/lib/core/questions/types";
import { NO_FACTS, type Step, type StepFacts } from "@/lib/core/steps/types";
import { readChapters } from "@/lib/core/webvtt/chapters";
import { readMarkingTrack, type MarkingCue } from "@/lib/core/webvtt/marking-track";
import { readVtt } from "@/lib/core/webvtt/read-vtt";
import { MOST_QUESTIONS, MOST_STEPS } from "@/lib/schemas/marking";
import { questionSchema } from "@/lib/schemas/questions";
import { stepFactsSchema, stepSchema } from "@/lib/schemas/steps";
import { understandTightening } from "@/lib/services/marking/understand-tightening";

export type Draft = { steps: Step[]; questions: Question[] };
type Placed<T> = T & { line: number };
type Files = { chapters: string | null; marking: string | null };

/**
 * What two WebVTT files make of a marking out; a file that is null leaves its part as it is.
 * @param newId  for cues whose id is none of ours: those are new
 * @returns the new marking out, or every problem of both files, each with its file and line
 */
export function readTracks(files: Files, before: Draft, durationMs: number, newId: () => string): Draft | { problems: FieldProblem[] } {
  const problems: FieldProblem[] = [];
  const problem = (file: "steps" | "facts and questions") => (line: number, message: string) => problems.push({ path: `${file}, line ${line}`, message });
  const steps = files.chapters === null ? before.steps.map((step) => ({ ...step, line: 0 })) : readSteps(files.chapters, durationMs, newId, problem("steps"));
  if (files.marking === null) {
    const kept = new Map(before.steps.map((step) => [step.id, step.facts]));
    const questions = before.questions.filter((question) => steps.some((step) => step.id === question.stepId));
    for (const question of questions) {
      const step = steps.find((candidate) => candidate.id === question.stepId);
      for (const message of questionProblems(question, step)) problem("steps")(step?.line ?? 0, `“${question.prompt}”: ${message} Give the file of facts and questions too.`);
    }
    return problems.length > 0 ? { problems } : { steps: steps.map((step) => bare(step, kept.get(step.id) ?? NO_FACTS)), questions };
  }
  const { facts, questions } = readMarking(files.marking, durationMs, newId, problem("facts and questions"));
  // Steps that could not be read would make every cue below seem lost.
  if (problems.length > 0) return { problems };
  for (const [stepId, { line }] of facts) if (!steps.some((step) => step.id === stepId)) problem("facts and questions")(line, "These facts belong to no step.");
  for (const { line, ...question } of questions) {
    const step = steps.find((candidate) => candidate.id === question.stepId);
    for (const message of questionProblems(question, step)) problem("facts and questions")(line, message);
  }
  if (problems.length > 0) return { problems };
  return { steps: steps.map((step) => bare(step, facts.get(step.id)?.facts ?? NO_FACTS)), questions: questions.map(({ line: _, ...question }) => question) };
}

type Report = (line: number, message: string) => unknown;

const bare = ({ id, title, startMs, endMs }: Step, facts: StepFacts): Step => ({ id, title, startMs, endMs, facts });

function readSteps(text: string, durationMs: number, newId: () => string, report: Report): Placed<Step>[] {
  const read = readChapters(text, durationMs);
  if ("problems" in read) {
    for (const { line, message } of read.problems) report(line, message);
    return [];
  }
  const lines = readVtt(text).cues.map((cue) => cue.line);
  if (read.chapters.length > MOST_STEPS) report(lines[MOST_STEPS] ?? 1, `One recording holds at most ${MOST_STEPS} steps.`);
  return read.chapters.map((chapter, index) => {
    const line = lines[index] ?? 0;
    const step = { ...chapter, id: ownId(chapter.id, newId), facts: NO_FACTS };
    const checked = stepSchema.safeParse(step);
    if (!checked.success) report(line + 1, sentenceOf(checked.error));
    return { ...(checked.success ? checked.data : step), line };
  });
}

const factsCueSchema = z.strictObject({ kind: z.literal("facts"), stepId: z.uuid(), facts: stepFactsSchema });
const questionCueSchema = questionSchema.omit({ id: true, atMs: true }).extend({ kind: z.literal("question") });

function readMarking(text: string, durationMs: number, newId: () => string, report: Report) {
  const facts = new Map<string, Placed<{ facts: StepFacts }>>();
  const questions: Placed<Question>[] = [];
  const track = readMarkingTrack(text, durationMs);
  if ("problems" in track) {
    for (const { line, message } of track.problems) report(line, message);
    return { facts, questions };
  }
  for (const cue of track.cues) {
    // The JSON stands under the timing.
    const line = cue.line + 1;
    if (kindOf(cue) === "facts") {
      const read = factsCueSchema.safeParse(cue.json);
      if (!read.success) report(line, sentenceOf(read.error));
      else {
        if (facts.has(read.data.stepId)) report(line, "The facts of this step stand further up already.");
        const understood = understandTightening(read.data.facts);
        for (const { message } of understood.problems) report(line, message);
        facts.set(read.data.stepId, { facts: understood.facts, line });
      }
    } else if (kindOf(cue) === "question") {
      const read = questionCueSchema.safeParse(cue.json);
      if (!read.success) report(line, sentenceOf(read.error));
      else {
        const { kind: _, ...rest } = read.data;
        questions.push({ ...rest, id: ownId(cue.id, newId), atMs: cue.startMs, line });
      }
    } else report(line, "Neither facts nor a question: “kind” is “facts” or “question”.");
  }
  if (questions.length > MOST_QUESTIONS) report(questions[MOST_QUESTIONS]?.line ?? 1, `One recording holds at most ${MOST_QUESTIONS} questions.`);
  return { facts, questions };
}

const kindOf = (cue: MarkingCue): unknown => (cue.json as { kind?: unknown } | null)?.kind;

const sentenceOf = (error: z.ZodError): string => error.issues.map(({ path, message }) => (path.length > 0 ? `${path.join(".")}: ${message}` : message)).join(" ");

/** Ids of ours are kept (the reader refuses one given twice); anything else is a cue written elsewhere and gets an id. */
const ownId = (id: string, newId: () => string): string => (z.uuid().safeParse(id).success ? id : newId());
