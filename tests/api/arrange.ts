import { randomBytes, randomUUID } from "node:crypto";
import { readFileSync } from "node:fs";
import { getDb } from "@/db/client";
import { startSession } from "@/db/queries/sessions";
import { demoId } from "@/db/seeds/demo/demo-id";
import { moduleId, personId, recordingId, taskId } from "@/db/seeds/demo/ids";
import type { Actor } from "@/lib/core/roles";
import type { TaskContent } from "@/lib/core/tasks/types";
import type { PracticeRunInput } from "@/lib/schemas/tasks";
import type { StartUploadInput } from "@/lib/schemas/uploads";
import { ask } from "@/lib/services/learning/ask";
import { markCriterion } from "@/lib/services/observations/mark-criterion";
import { startObservation } from "@/lib/services/observations/start-observation";
import { invitePerson } from "@/lib/services/people/invite-person";
import { logPracticeRun } from "@/lib/services/practice/log-practice-run";
import { startUpload } from "@/lib/services/uploads/start-upload";
import { today } from "@/lib/services/clock";
import { DEMO_PASSWORD, type World } from "../support/api-world";
import { tokenSentTo } from "../support/letters";
import { bringIn, sendParts, someFile } from "../support/uploads";
import type { Sent, Send } from "./rows";

// What a request of the matrix needs to be valid, in the demo's workshop and college.
export const FILM = recordingId("front-brake-discs");
export const MODULE = moduleId("front-brake-discs");
export const TASK = taskId("road-wheel");
export const PRACTISED_TASK = taskId("lift-induction");
export const READY_TASK = taskId("front-brake-discs");
export const COHORT = demoId("cohort/lv-26");
export const TOMASZ = personId("tomasz");
const ASHA = personId("asha");

const known = (actor: Actor | null): Actor => {
  if (!actor) throw new Error("The world has nobody there.");
  return actor;
};
export const mentorOf = (world: World): Actor => known(world.at("vennick", "mentor"));
export const apprenticeOf = (world: World): Actor => known(world.at("vennick", "apprentice"));
const assessorOf = (world: World): Actor => known(world.at("merrowdale", "assessor"));

async function first<T>(rows: PromiseLike<T[]>): Promise<T> {
  const [row] = await rows;
  if (!row) throw new Error("The demo has no such row.");
  return row;
}

export async function invitation(world: World): Promise<{ invitationId: string; token: string }> {
  const email = `${randomUUID()}@people.test`;
  const { invitationId } = await invitePerson(known(world.at("vennick", "manager")), { name: "Invited", email, roles: ["mentor"] });
  return { invitationId, token: await tokenSentTo(email) };
}

export const otherSession = async (caller: Actor | null): Promise<string> =>
  caller ? startSession(getDb(), { personId: caller.personId, device: "another", days: 1 }) : randomUUID();

const photoFile = (): Buffer => Buffer.concat([readFileSync("db/seeds/demo/plate.png"), randomBytes(8)]);

export const purposeOf = (caller: Actor | null): Partial<StartUploadInput> =>
  caller?.roles.has("apprentice") && !caller.roles.has("mentor") ? { purpose: "evidence", fileName: "photo.png", mediaType: "image/png" } : {};

/** Whose upload it is: the caller's own where they may have one, else the mentor's. */
const sender = (world: World, caller: Actor | null): Actor =>
  caller?.organisation.id === world.orgs.vennick.id && caller.roles.has("apprentice") ? caller : mentorOf(world);

/** One person may have only so many uploads open. */
const giveUpOthers = (world: World, actor: Actor) =>
  world.owner("uploads").where({ person_id: actor.personId, state: "open" }).update({ state: "aborted", ended_at: new Date() });

export const openUpload: Send = async (world, caller) => {
  const actor = sender(world, caller);
  await giveUpOthers(world, actor);
  const { uploadId } = await startUpload(actor, someFile(100, purposeOf(actor)));
  return { params: { uploadId } };
};

export const sentUpload: Send = async (world, caller) => {
  const actor = sender(world, caller);
  await giveUpOthers(world, actor);
  const bytes = photoFile();
  const upload = await startUpload(actor, someFile(bytes.length, purposeOf(actor)));
  await sendParts(actor, upload, bytes);
  return { params: { uploadId: upload.uploadId } };
};

export const photo = async (world: World): Promise<string> => {
  const actor = apprenticeOf(world);
  return (await bringIn(actor, photoFile(), purposeOf(actor))).fileId;
};

async function assignmentRow(): Promise<{ id: string; content: { steps: { questions?: { id: string }[] }[]; questions?: { id: string }[] } }> {
  return first(
    getDb()("assignments as a")
      .join("module_revisions as r", "r.id", "a.module_revision_id")
      .select("a.id", "r.content")
      .where({ "a.apprentice_id": ASHA, "a.module_id": MODULE }),
  );
}
export const assignment = async (_world: World, _caller: Actor | null): Promise<Sent> => ({ params: { assignmentId: (await assignmentRow()).id } });

export const questionId = async (): Promise<string> =>
  (await first(getDb()("questions").select("id").where({ recording_id: FILM, kind: "one_of" }).orderBy("at_ms"))).id;

export const answer: Send = async (world) => {
  const { id } = await assignmentRow();
  const asked = await ask(apprenticeOf(world), id, await questionId());
  const choiceId = asked.ask.kind === "one_of" ? asked.ask.choices[0]?.id : undefined;
  return { params: { assignmentId: id }, body: { attemptId: asked.attemptId, given: { kind: "one_of", choiceId } } };
};

export const practiceRun = (): PracticeRunInput => ({
  doneOn: today(),
  vehicle: "DEMO 001",
  jobCardNumber: "JC-1",
  minutes: 30,
  note: "",
  idempotencyKey: randomUUID(),
});

export const loggedRun: Send = async (world) => ({ params: await logPracticeRun(apprenticeOf(world), TASK, practiceRun()) });

export const readinessId = async (): Promise<string> =>
  (await first(getDb()("readiness").select("id").where({ apprentice_id: ASHA }).whereNull("ended_at"))).id;

export const newSheet = (task: string) => ({
  apprenticeId: ASHA,
  taskId: task,
  vehicle: "DEMO 001",
  jobCardNumber: "JC-2",
  idempotencyKey: randomUUID(),
});

export const sheet = async (world: World, task: string): Promise<string> =>
  (await startObservation(assessorOf(world), newSheet(task))).observationId;

const nothingMet = { mark: "not_yet", reading: null, prompts: 0, remark: "" } as const;

async function criteriaOf(task: string): Promise<TaskContent["criteria"]> {
  const row = await first<{ content: TaskContent }>(getDb()("task_revisions").select("content").where({ task_id: task }).orderBy("number", "desc"));
  return row.content.criteria;
}

export const criterion: Send = async (world) => ({
  params: { observationId: await sheet(world, TASK), criterionKey: (await criteriaOf(TASK))[0]?.key ?? "" },
  body: nothingMet,
});

/** A sheet of its own, with everything put down as not yet. */
export const filledSheet: Send = async (world) => {
  const actor = assessorOf(world);
  const task = taskId("rear-drum-brakes");
  const observationId = await sheet(world, task);
  for (const { key } of await criteriaOf(task)) await markCriterion(actor, { observationId, criterionKey: key }, nothingMet);
  await world.resetPassword(actor);
  return { params: { observationId }, body: { password: DEMO_PASSWORD, level: null, feedback: "Again next week." } };
};

/** One of the apprentice's that the college's assessor signed and nobody has withdrawn. */
export const signOffId = async (): Promise<string> =>
  (
    await first(
      getDb()("sign_offs as s")
        .select("s.id")
        .where({ "s.apprentice_id": ASHA, "s.assessor_id": personId("idris") })
        .whereNotExists(getDb()("sign_off_changes as c").whereRaw("c.sign_off_id = s.id")),
    )
  ).id;
