import { moduleId, moduleRevisionId, orgId, personId, recordingId, taskId, taskRevisionId } from "@/db/seeds/demo/ids";
import { readFileSync } from "node:fs";
import type { Knex } from "knex";
import { demoId } from "@/db/seeds/demo/demo-id";
import { DEMO_FILMS, MEDIA_FILES, mediaPath, type DemoFilm } from "@/db/seeds/demo/films/films";
import type { LedgerWriter } from "@/db/seeds/demo/ledger-writer";
import { dayFrom } from "@/db/seeds/demo/seed-cast";
import { DEMO_TASKS, type DemoTaskKey } from "@/db/seeds/demo/tasks";
import { revisionHash } from "@/lib/core/modules/revision-hash";
import type { ModuleContent } from "@/lib/core/modules/types";

type RenditionName = "480p" | "720p" | "poster" | "storyboard_sheet" | "storyboard_track";

/** Puts one shipped file into the object store and says where it lies there. `subjectId` is the recording, or the evidence's file. */
export type PutFile = (
  of: { organisationId: string; subjectId: string; kind: RenditionName | "evidence" },
  path: string,
  contentType: string,
) => Promise<{ storeKey: string; sizeBytes: number }>;


/** The task whose work changed lately, so that everything held on it is due for a re-check. */
export const CHANGED_TASK: DemoTaskKey = "wheel-bearing";
export const CHANGED_DAYS_AGO = 20;
export const PUBLISHED_DAYS_AGO = 900;

/** Vehicle and mentor of each film, in the cast's keys. */
const FILM_CAST: Record<string, { vehicle: string; mentor: string; filmedDaysAgo: number; opens: DemoTaskKey }> = {
  "front-brake-discs": { vehicle: "DEMO 001", mentor: "sunniva", filmedDaysAgo: 820, opens: "front-brake-discs" },
  "auxiliary-belt": { vehicle: "DEMO 002", mentor: "bertram", filmedDaysAgo: 810, opens: "auxiliary-belt" },
};

const castOf = (film: DemoFilm) => {
  const cast = FILM_CAST[film.key];
  if (!cast) throw new Error(`The film “${film.key}” has no cast.`);
  return cast;
};

/** The college's tasks, published; one of them a second time because the work changed. */
export async function seedTasks(trx: Knex.Transaction, day: string, ledger: LedgerWriter): Promise<void> {
  const merrowdale = orgId("merrowdale");
  const by = personId("deepa");
  for (const [key, content] of Object.entries(DEMO_TASKS) as [DemoTaskKey, (typeof DEMO_TASKS)[DemoTaskKey]][]) {
    const publishedAt = `${dayFrom(day, -PUBLISHED_DAYS_AGO)}T09:00:00.000Z`;
    await trx("tasks").insert({ id: taskId(key), organisation_id: merrowdale, draft: JSON.stringify(content), created_by: by, created_at: publishedAt });
    await publishTask(trx, ledger, { key, number: 1, content, publishedAt, workChanged: false });
  }
  const changed = DEMO_TASKS[CHANGED_TASK];
  const content = { ...changed, conditions: `${changed.conditions} Since the last revision the hub nut is always renewed.` };
  const publishedAt = `${dayFrom(day, -CHANGED_DAYS_AGO)}T09:00:00.000Z`;
  await publishTask(trx, ledger, { key: CHANGED_TASK, number: 2, content, publishedAt, workChanged: true });
}

type TaskPublication = { key: DemoTaskKey; number: number; content: (typeof DEMO_TASKS)[DemoTaskKey]; publishedAt: string; workChanged: boolean };

async function publishTask(trx: Knex.Transaction, ledger: LedgerWriter, of: TaskPublication): Promise<void> {
  const contentHash = revisionHash(of.content);
  await trx("task_revisions").insert({
    id: taskRevisionId(of.key, of.number),
    organisation_id: orgId("merrowdale"),
    task_id: taskId(of.key),
    number: of.number,
    content: JSON.stringify(of.content),
    content_hash: contentHash,
    work_changed: of.workChanged,
    published_by: personId("deepa"),
    published_at: of.publishedAt,
  });
  const subject = { taskId: taskId(of.key), number: of.number, contentHash, workChanged: of.workChanged };
  const personal = [{ personId: personId("deepa"), label: "published_by", value: "Deepa Thornquist" }];
  await ledger.append(orgId("merrowdale"), { kind: "task_revision", subject, personal }, of.publishedAt);
}

/** The films as recordings that are marked out, each with a module published from all its steps. */
export async function seedRecordings(trx: Knex.Transaction, day: string, ledger: LedgerWriter, putFile: PutFile): Promise<void> {
  for (const film of DEMO_FILMS) {
    await seedRecording(trx, day, film, putFile);
    await seedModule(trx, day, film, ledger);
  }
}

const RENDITION_OF = {
  "720p.mp4": { kind: "720p", type: "video/mp4", width: 1280, height: 720 },
  "480p.mp4": { kind: "480p", type: "video/mp4", width: 854, height: 480 },
  "poster.jpg": { kind: "poster", type: "image/jpeg", width: null, height: null },
  "storyboard.jpg": { kind: "storyboard_sheet", type: "image/jpeg", width: null, height: null },
  "storyboard.vtt": { kind: "storyboard_track", type: "text/vtt", width: null, height: null },
} as const;

async function seedRecording(trx: Knex.Transaction, day: string, film: DemoFilm, putFile: PutFile): Promise<void> {
  const organisation = orgId("vennick");
  const cast = castOf(film);
  const filmedAt = `${dayFrom(day, -cast.filmedDaysAgo)}T10:30:00.000Z`;
  const files = new Map<string, string>();
  for (const name of MEDIA_FILES) {
    const rendition = name in RENDITION_OF ? RENDITION_OF[name as keyof typeof RENDITION_OF] : undefined;
    if (!rendition) continue;
    const at = { organisationId: organisation, subjectId: recordingId(film.key), kind: rendition.kind };
    const { storeKey, sizeBytes } = await putFile(at, mediaPath(film.key, name), rendition.type);
    const id = demoId(`file/${film.key}/${name}`);
    await trx("files").insert({ id, organisation_id: organisation, store_key: storeKey, media_type: rendition.type, size_bytes: sizeBytes, created_at: filmedAt });
    files.set(name, id);
  }
  await trx("recordings").insert({
    id: recordingId(film.key),
    organisation_id: organisation,
    title: film.script.title,
    vehicle_id: demoId(`vehicle/${cast.vehicle}`),
    recorded_by: personId(cast.mentor),
    source_file_id: files.get("720p.mp4"),
    state: "ready",
    duration_ms: film.timings.durationMs,
    width: 1280,
    height: 720,
    has_sound: true,
    consent: "nobody_in_shot",
    consent_note: "Drawn scenes, invented.",
    private_details_checked_at: filmedAt,
    private_details_checked_by: personId(cast.mentor),
    marking_version: 1,
    marking_saved_at: filmedAt,
    marking_saved_by: personId(cast.mentor),
    created_at: filmedAt,
  });
  await trx("recording_stages").insert(
    ["probe", "480p", "720p", "poster", "storyboard"].map((stage) => ({ recording_id: recordingId(film.key), stage, state: "done", percent: 100, attempt: 1, finished_at: filmedAt })),
  );
  await trx("renditions").insert(
    [...files].map(([name, fileId]) => {
      const { kind, width, height } = RENDITION_OF[name as keyof typeof RENDITION_OF];
      return { organisation_id: organisation, recording_id: recordingId(film.key), kind, file_id: fileId, width, height };
    }),
  );
  await trx("captions").insert({ recording_id: recordingId(film.key), language: "en", vtt: readFileSync(mediaPath(film.key, "captions.vtt"), "utf8") });
  await seedMarkingOut(trx, film);
}

async function seedMarkingOut(trx: Knex.Transaction, film: DemoFilm): Promise<void> {
  const { steps, questions } = film.markingOut;
  await trx("steps").insert(
    steps.map((step) => ({
      id: step.id,
      organisation_id: orgId("vennick"),
      recording_id: recordingId(film.key),
      title: step.title,
      start_ms: step.startMs,
      end_ms: step.endMs,
      facts: JSON.stringify(step.facts),
    })),
  );
  await trx("questions").insert(
    questions.map((question) => ({
      id: question.id,
      recording_id: recordingId(film.key),
      step_id: question.stepId,
      at_ms: question.atMs,
      kind: question.body.kind,
      prompt: question.prompt,
      explanation: question.explanation,
      look_again_ms: question.lookAgainMs,
      safety_critical: question.safetyCritical,
      body: JSON.stringify(question.body),
    })),
  );
}

async function seedModule(trx: Knex.Transaction, day: string, film: DemoFilm, ledger: LedgerWriter): Promise<void> {
  const organisation = orgId("vennick");
  const cast = castOf(film);
  const publishedAt = `${dayFrom(day, -cast.filmedDaysAgo + 3)}T16:00:00.000Z`;
  const content: ModuleContent = {
    title: film.script.title,
    summary: film.script.summary,
    steps: film.markingOut.steps.map((step) => ({ ...step, recordingId: recordingId(film.key) })),
    questions: film.markingOut.questions,
    passRule: { share: 0.8 },
    taskIds: [taskId(cast.opens)],
  };
  const contentHash = revisionHash(content);
  const own = { organisation_id: organisation, module_id: moduleId(film.key) };
  await trx("modules").insert({
    id: moduleId(film.key),
    organisation_id: organisation,
    title: content.title,
    summary: content.summary,
    pass_share: content.passRule.share,
    created_by: personId(cast.mentor),
    created_at: publishedAt,
  });
  await trx("module_steps").insert(content.steps.map((step, position) => ({ ...own, step_id: step.id, position })));
  await trx("module_tasks").insert(content.taskIds.map((id) => ({ ...own, task_id: id })));
  await trx("module_revisions").insert({
    id: moduleRevisionId(film.key),
    ...own,
    number: 1,
    content: JSON.stringify(content),
    content_hash: contentHash,
    work_changed: false,
    published_by: personId(cast.mentor),
    published_at: publishedAt,
  });
  await trx("module_revision_tasks").insert(content.taskIds.map((id) => ({ module_revision_id: moduleRevisionId(film.key), task_id: id })));
  await trx("module_revision_recordings").insert({ organisation_id: organisation, module_revision_id: moduleRevisionId(film.key), recording_id: recordingId(film.key) });
  const subject = { moduleId: moduleId(film.key), number: 1, contentHash, workChanged: false };
  const personal = [{ personId: personId(cast.mentor), label: "published_by", value: film.script.mentor }];
  await ledger.append(organisation, { kind: "module_revision", subject, personal }, publishedAt);
}
