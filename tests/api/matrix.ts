import { randomUUID } from "node:crypto";
import type { DoorKey } from "@/lib/schemas/contract/all";
import { createModule } from "@/lib/services/modules/create-module";
import { askForNewPassword } from "@/lib/services/accounts/ask-for-new-password";
import { addEvidence } from "@/lib/services/practice/add-evidence";
import { DEMO_PASSWORD } from "../support/api-world";
import { tokenSentTo } from "../support/letters";
import { createMember } from "../support/factories";
import { createRecording } from "../support/factories-work";
import { someFile } from "../support/uploads";
import { atCollege, everybody, members, page, type Row, type Send } from "./rows";
import * as arrange from "./arrange";

const mentors = (send: Send) => members({ mentor: 200 }, send);
const managers = (send: Send) => members({ manager: 200 }, send);
const learners = (send: Send) => members({ apprentice: 200 }, send);
const assessors = (send: Send) => atCollege({ assessor: 200 }, send);
const freshRecording: Send = async (world) => ({ params: { recordingId: await createRecording(arrange.mentorOf(world)) } });
const film: Send = () => ({ params: { recordingId: arrange.FILM } });

/** Every door, said by hand: what each role gets, and a request that is valid for whoever may. Independent of the contract's own roles. */
export const DOORS: Record<DoorKey, Row> = {
  "GET /openapi.json": everybody(200),
  "POST /invitations/look": everybody(200, async (world) => ({ body: { token: (await arrange.invitation(world)).token } })),
  // Somebody signed in can't accept what was sent to another address.
  "POST /invitations/accept": everybody(
    403,
    async (world) => ({
      body: { token: (await arrange.invitation(world)).token, person: { name: "Newcomer", password: "a long phrase for tests", dateOfBirth: null } },
    }),
    { anonymous: 200 },
  ),
  "POST /password-resets": everybody(200, () => ({ body: { email: `nobody-${randomUUID()}@people.test` } })),
  "POST /password-resets/use": everybody(200, async (world) => {
    const { email } = await createMember(world.orgs.vennick, "mentor", { passwordHash: "x" });
    await askForNewPassword(email);
    return { body: { token: await tokenSentTo(email), password: "a long phrase for tests" } };
  }),
  "PUT /account/password": everybody(
    200,
    async (world, caller) => {
      await world.resetPassword(caller);
      return { body: { current: DEMO_PASSWORD, next: "another long phrase for tests" } };
    },
    { anonymous: 401 },
  ),
  "DELETE /account/sessions": everybody(200, undefined, { anonymous: 401 }),
  "DELETE /account/sessions/{sessionId}": everybody(200, async (_, caller) => ({ params: { sessionId: await arrange.otherSession(caller) } }), {
    anonymous: 401,
  }),

  "POST /orgs/{org}/invitations": managers(() => ({ body: { name: "Invited", email: `${randomUUID()}@people.test`, roles: ["mentor"] } })),
  "DELETE /orgs/{org}/invitations/{invitationId}": managers(async (world) => ({ params: { invitationId: (await arrange.invitation(world)).invitationId } })),
  "POST /orgs/{org}/invitations/{invitationId}/letters": managers(async (world) => ({
    params: { invitationId: (await arrange.invitation(world)).invitationId },
  })),
  "PUT /orgs/{org}/people/{personId}/roles": managers(async (world) => ({
    params: { personId: (await createMember(world.orgs.vennick, "mentor")).personId },
    body: { roles: ["assessor"] },
  })),
  "DELETE /orgs/{org}/people/{personId}": managers(async (world) => ({
    params: { personId: (await createMember(world.orgs.vennick, "mentor")).personId },
  })),

  "POST /orgs/{org}/uploads": members({ mentor: 200, apprentice: 200 }, (_, caller) => ({ body: someFile(100, arrange.purposeOf(caller)) })),
  "GET /orgs/{org}/uploads": members({ mentor: 200, apprentice: 200 }),
  "GET /orgs/{org}/uploads/{uploadId}": members({ mentor: 200, apprentice: 200 }, arrange.openUpload),
  "POST /orgs/{org}/uploads/{uploadId}/part-addresses": members({ mentor: 200, apprentice: 200 }, async (world, caller) => ({
    ...(await arrange.openUpload(world, caller)),
    body: { partNumbers: [1] },
  })),
  "POST /orgs/{org}/uploads/{uploadId}/completion": members({ mentor: 200, apprentice: 200 }, arrange.sentUpload),
  "DELETE /orgs/{org}/uploads/{uploadId}": members({ mentor: 200, apprentice: 200 }, arrange.openUpload),

  "GET /orgs/{org}/recordings": mentors(() => ({})),
  "GET /orgs/{org}/recordings/{recordingId}": mentors(film),
  "PATCH /orgs/{org}/recordings/{recordingId}": mentors(async (world, caller) => ({
    ...(await freshRecording(world, caller)),
    body: { title: "Another title" },
  })),
  "DELETE /orgs/{org}/recordings/{recordingId}": mentors(freshRecording),
  "POST /orgs/{org}/recordings/{recordingId}/preparation": mentors(async (world) => ({
    params: { recordingId: await createRecording(arrange.mentorOf(world), { failed: true }) },
  })),
  "GET /orgs/{org}/recordings/{recordingId}/media": mentors(film),
  "PUT /orgs/{org}/recordings/{recordingId}/captions": mentors(async (world, caller) => ({
    ...(await freshRecording(world, caller)),
    body: { text: "WEBVTT\n\n00:00.000 --> 00:01.000\nLift the car.\n" },
  })),
  "GET /orgs/{org}/recordings/{recordingId}/marking": mentors(film),
  "PUT /orgs/{org}/recordings/{recordingId}/marking": mentors(async (world, caller) => ({
    ...(await freshRecording(world, caller)),
    body: { version: 0, steps: [], questions: [] },
  })),
  "GET /orgs/{org}/recordings/{recordingId}/chapters.vtt": mentors(film),
  "GET /orgs/{org}/recordings/{recordingId}/questions.vtt": mentors(film),
  "GET /orgs/{org}/recordings/{recordingId}/captions.vtt": mentors(film),
  "POST /orgs/{org}/recordings/{recordingId}/marking/imports": mentors(async (world, caller) => ({
    ...(await freshRecording(world, caller)),
    body: { version: 0, chapters: "WEBVTT\n\n00:00.000 --> 00:05.000\nLift the car\n", marking: null },
  })),

  "POST /orgs/{org}/modules": mentors(() => ({ body: { title: "A module", recordingId: null } })),
  "PUT /orgs/{org}/modules/{moduleId}": mentors(async (world) => ({
    params: await createModule(arrange.mentorOf(world), { title: "A module", recordingId: null }),
    body: { version: 1, title: "Another title", summary: "", passShare: 0.8, stepIds: [], taskIds: [] },
  })),
  "POST /orgs/{org}/modules/{moduleId}/revisions": mentors(async (world) => ({
    params: await createModule(arrange.mentorOf(world), { title: "A module", recordingId: arrange.FILM }),
    body: { version: 1, workChanged: false },
  })),
  "POST /orgs/{org}/modules/{moduleId}/assignments": mentors(() => ({
    params: { moduleId: arrange.MODULE },
    body: { apprenticeIds: [arrange.TOMASZ], dueOn: "2099-01-01" },
  })),

  "GET /orgs/{org}/assignments/{assignmentId}/media": learners(arrange.assignment),
  "GET /orgs/{org}/assignments/{assignmentId}/questions.vtt": learners(async (world, caller) => ({
    ...(await arrange.assignment(world, caller)),
    query: { recordingId: arrange.FILM },
  })),
  "POST /orgs/{org}/assignments/{assignmentId}/spans": learners(async (world, caller) => ({
    ...(await arrange.assignment(world, caller)),
    body: { recordingId: arrange.FILM, spans: [[0, 1000]], rate: 1 },
  })),
  "POST /orgs/{org}/assignments/{assignmentId}/attempts": learners(async (world, caller) => ({
    ...(await arrange.assignment(world, caller)),
    body: { questionId: await arrange.questionId() },
  })),
  "POST /orgs/{org}/assignments/{assignmentId}/answers": learners(arrange.answer),

  "POST /orgs/{org}/tasks/{taskId}/practice-runs": learners(() => ({ params: { taskId: arrange.TASK }, body: arrange.practiceRun() })),
  "POST /orgs/{org}/practice-runs/{practiceRunId}/confirmation": mentors(arrange.loggedRun),
  "POST /orgs/{org}/tasks/{taskId}/evidence": learners(async (world) => ({
    params: { taskId: arrange.TASK },
    body: { fileId: await arrange.photo(world), note: "" },
  })),
  "DELETE /orgs/{org}/evidence/{evidenceId}": learners(async (world) => ({
    params: await addEvidence(arrange.apprenticeOf(world), arrange.TASK, { fileId: await arrange.photo(world), note: "" }),
  })),
  "PUT /orgs/{org}/tasks/{taskId}/readiness": learners(() => ({ params: { taskId: arrange.READY_TASK } })),
  "DELETE /orgs/{org}/tasks/{taskId}/readiness": learners(() => ({ params: { taskId: arrange.PRACTISED_TASK } })),
  "PUT /orgs/{org}/readiness/{readinessId}/booking": assessors(async () => ({
    params: { readinessId: await arrange.readinessId() },
    body: { startsAt: "2099-01-01T09:00:00Z" },
  })),

  "POST /orgs/{org}/observations": assessors(() => ({ body: arrange.newSheet(arrange.TASK) })),
  "PUT /orgs/{org}/observations/{observationId}/marks/{criterionKey}": assessors(arrange.criterion),
  "POST /orgs/{org}/observations/{observationId}/stop": assessors(async (world) => ({
    params: { observationId: await arrange.sheet(world, arrange.PRACTISED_TASK) },
    body: { reason: "The stand was not under the jacking point." },
  })),
  "GET /orgs/{org}/observations/{observationId}/outcome": assessors(async (world) => ({
    params: { observationId: await arrange.sheet(world, arrange.TASK) },
  })),
  "POST /orgs/{org}/observations/{observationId}/sign-off": assessors(arrange.filledSheet),
  // The demo's own assessor signed it; a verifier of the college may too.
  "POST /orgs/{org}/sign-offs/{signOffId}/withdrawal": atCollege({ assessor: 200, verifier: 200 }, async (world, caller) => {
    await world.resetPassword(caller);
    return { params: { signOffId: await arrange.signOffId() }, body: { password: DEMO_PASSWORD, reason: "Signed on the wrong sheet." } };
  }),

  "GET /orgs/{org}/cohorts/{cohortId}/progress.csv": atCollege({ liaison: 200 }, () => ({ params: { cohortId: arrange.COHORT } })),
};

const anyMember = { mentor: 200, apprentice: 200, assessor: 200, liaison: 200, manager: 200, verifier: 200 } as const;
const staff = { mentor: 200, assessor: 200, liaison: 200, manager: 200, verifier: 200 } as const;

/** Every page, by its address without groups. */
export const PAGES: Record<string, Row> = {
  "/": everybody("redirect", undefined, { anonymous: 200 }),
  "/forgotten": everybody(200),
  "/join": everybody(200),
  "/legend": everybody(200),
  "/new-password": everybody(200),
  "/sign-in": everybody("redirect", undefined, { anonymous: 200 }),
  "/account": everybody(200, undefined, { anonymous: "redirect" }),
  "/o": everybody(200, undefined, { anonymous: "redirect" }),
  "/o/[org]": page({ ...Object.fromEntries(Object.keys(anyMember).map((role) => [role, "redirect"])) }),
  "/o/[org]/[...missing]": page({}),
  "/o/[org]/today": page(anyMember),
  "/o/[org]/recordings": page({ mentor: 200 }),
  "/o/[org]/recordings/[recordingId]": page({ mentor: 200 }, film),
  "/o/[org]/recordings/[recordingId]/bench": page({ mentor: 200 }, film),
  "/o/[org]/modules": page({ mentor: 200 }),
  "/o/[org]/modules/[moduleId]": page({ mentor: 200 }, () => ({ params: { moduleId: arrange.MODULE } })),
  "/o/[org]/tasks": page(staff),
  "/o/[org]/tasks/[taskId]": page(staff, () => ({ params: { taskId: arrange.TASK } })),
  "/o/[org]/apprentices": page({ mentor: 200 }),
  "/o/[org]/learn": page({ apprentice: 200 }),
  "/o/[org]/learn/[assignmentId]": page({ apprentice: 200 }, arrange.assignment),
  "/o/[org]/practice": page({ apprentice: 200 }),
  "/o/[org]/practice/[taskId]": page({ apprentice: 200 }, () => ({ params: { taskId: arrange.TASK } })),
  "/o/[org]/record": page({ apprentice: 200 }),
  "/o/[org]/ready": page({ assessor: 200 }, undefined, "merrowdale"),
  "/o/[org]/observations": page({ assessor: 200 }, undefined, "merrowdale"),
  "/o/[org]/observations/[observationId]": page(
    { assessor: 200 },
    async (world) => ({ params: { observationId: await arrange.sheet(world, arrange.TASK) } }),
    "merrowdale",
  ),
  "/o/[org]/sign-offs": page({ assessor: 200, liaison: 200, manager: 200, verifier: 200 }),
  // The apprentice's own; staff of the workshop share the record.
  "/o/[org]/sign-offs/[signOffId]": page(anyMember, async () => ({ params: { signOffId: await arrange.signOffId() } })),
  "/o/[org]/cohorts": page({ liaison: 200 }, undefined, "merrowdale"),
  "/o/[org]/cohorts/[cohortId]": page({ liaison: 200 }, () => ({ params: { cohortId: arrange.COHORT } }), "merrowdale"),
  "/o/[org]/limits": page({ manager: 200, mentor: 200 }),
  "/o/[org]/people": page({ manager: 200 }),
};
