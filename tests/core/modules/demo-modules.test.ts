import { expect, test } from "vitest";
import { DEMO_FILMS } from "@/db/seeds/demo/films/films";
import { moduleProblems } from "@/lib/core/modules/module-problems";
import { stepPublishProblems } from "@/lib/core/steps/publish-problems";

// The loader writes revisions without the service, so what the service would refuse is asked here.
test.each(DEMO_FILMS)("the demo's module of $key could be published by hand", ({ script, markingOut }) => {
  const steps = markingOut.steps.map((step) => ({ ...step, recordingId: "recording" }));
  const content = { title: script.title, summary: script.summary, steps, questions: markingOut.questions, passRule: { share: 0.8 }, taskIds: [] };
  expect([...moduleProblems(content), ...steps.flatMap((step) => stepPublishProblems(step))]).toEqual([]);
});
