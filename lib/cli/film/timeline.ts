import type { FilmScript, FilmTimings, Scene, StepScript } from "@/db/seeds/demo/films/types";

/** Quiet before a scene's first words, so that the picture is seen first, and after each line. */
const LEAD_MS = 500;
const PAUSE_MS = 420;
/** A last look before the step's end. */
const STEP_END_MS = 600;

export type PlacedScene = { scene: Scene; step: StepScript; stepNumber: number; startMs: number; endMs: number; lineStartMs: number[] };
export type Timeline = { timings: FilmTimings; scenes: PlacedScene[] };

/**
 * Lays a film out in time from the lengths of its spoken lines.
 * @param lengthMs  length of each line in the script's order, in whole ms
 */
export function layOut(script: FilmScript, lengthMs: readonly number[]): Timeline {
  const timings: FilmTimings = { film: script.key, durationMs: 0, steps: [], scenes: [], lines: [] };
  const scenes: PlacedScene[] = [];
  let now = 0;
  let spoken = 0;
  script.steps.forEach((step, stepIndex) => {
    const stepStart = now;
    step.scenes.forEach((scene, sceneIndex) => {
      const startMs = now;
      now += LEAD_MS;
      const lineStartMs = scene.lines.map((line, index) => {
        const start = now;
        const end = start + (lengthMs[spoken] ?? 0);
        spoken += 1;
        timings.lines.push({ key: line.key ?? `${step.key}.${sceneIndex + 1}.${index + 1}`, step: step.key, text: line.text, startMs: start, endMs: end });
        now = end + PAUSE_MS + (line.holdMs ?? 0);
        return start;
      });
      if (sceneIndex === step.scenes.length - 1) now += STEP_END_MS;
      scenes.push({ scene, step, stepNumber: stepIndex + 1, startMs, endMs: now, lineStartMs });
      timings.scenes.push({ step: step.key, picture: scene.picture, startMs, endMs: now });
    });
    timings.steps.push({ key: step.key, title: step.title, startMs: stepStart, endMs: now });
  });
  timings.durationMs = now;
  return { timings, scenes };
}

/** Captions of the spoken lines. */
export function captionsOf(timings: FilmTimings): { startMs: number; endMs: number; text: string }[] {
  return timings.lines.map(({ startMs, endMs, text }) => ({ startMs, endMs, text }));
}
