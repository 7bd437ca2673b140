import { randomBytes, randomUUID } from "node:crypto";
import { beforeAll, expect, test } from "vitest";
import { getDb } from "@/db/client";
import { orgId, personId } from "@/db/seeds/demo/ids";
import type { Actor } from "@/lib/core/roles";
import { viewCohort, viewCohorts } from "@/lib/services/cohorts/view-cohort";
import { viewGiven } from "@/lib/services/learning/view-given";
import { viewModules } from "@/lib/services/modules/view-modules";
import { viewOpenSheets } from "@/lib/services/observations/view-open-sheets";
import { viewReady } from "@/lib/services/observations/view-ready";
import { viewPeople } from "@/lib/services/people/view-people";
import { viewPractice } from "@/lib/services/practice/view-practice";
import { viewRecord } from "@/lib/services/record/view-record";
import { viewRecordings } from "@/lib/services/recordings/view-recordings";
import { viewSignOffs } from "@/lib/services/sign-offs/view-sign-offs";
import { viewTasks } from "@/lib/services/tasks/view-tasks";
import { viewToday } from "@/lib/services/today/view-today";
import { viewApprentices } from "@/lib/services/workshop/view-apprentices";
import { viewWorkshopPlate } from "@/lib/services/workshop/view-workshop-plate";
import { apiWorld, type Place, type World } from "../support/api-world";
import { testDatabase } from "../support/database";
import { testStore } from "../support/store";
import { COHORT, MODULE } from "./arrange";
import type { Role } from "@/lib/core/roles";

const { owner } = testDatabase();
testStore();
const ROWS = 300;
let world: World;

async function countQueries(work: () => Promise<unknown>): Promise<number> {
  let queries = 0;
  const count = () => (queries += 1);
  getDb().on("query", count);
  try {
    await work();
  } finally {
    getDb().removeListener("query", count);
  }
  return queries;
}

/** Each page's own query set: its view service, for somebody who may see it. */
const PAGES: [page: string, place: Place, role: Role, load: (actor: Actor) => Promise<unknown>][] = [
  ["recordings", "vennick", "mentor", viewRecordings],
  ["modules", "vennick", "mentor", viewModules],
  ["tasks", "vennick", "mentor", viewTasks],
  ["apprentices", "vennick", "mentor", viewApprentices],
  ["limits", "vennick", "manager", viewWorkshopPlate],
  ["people", "vennick", "manager", viewPeople],
  ["learn", "vennick", "apprentice", viewGiven],
  ["practice", "vennick", "apprentice", viewPractice],
  ["record", "vennick", "apprentice", viewRecord],
  ["ready", "merrowdale", "assessor", viewReady],
  ["observations", "merrowdale", "assessor", viewOpenSheets],
  ["sign-offs", "merrowdale", "verifier", viewSignOffs],
  ["cohorts", "merrowdale", "liaison", viewCohorts],
  ["one cohort", "merrowdale", "liaison", (actor) => viewCohort(actor, COHORT)],
  ["today, mentor", "vennick", "mentor", viewToday],
  ["today, apprentice", "vennick", "apprentice", viewToday],
  ["today, assessor", "merrowdale", "assessor", viewToday],
  ["today, liaison", "merrowdale", "liaison", viewToday],
  ["today, manager", "vennick", "manager", viewToday],
  ["today, verifier", "merrowdale", "verifier", viewToday],
];

const few: number[] = [];
const countAll = async (): Promise<number[]> => {
  const counts: number[] = [];
  for (const [, place, role, load] of PAGES) counts.push(await countQueries(() => load(world.at(place, role) as Actor)));
  return counts;
};
let many: number[] = [];

beforeAll(async () => {
  world = await apiWorld(owner());
  few.push(...(await countAll()));
  await owner().transaction(grow);
  many = await countAll();
}, 60_000);

test("counting sees queries", () => {
  for (const [index, [page]] of PAGES.entries()) expect(few[index], page).toBeGreaterThan(0);
});

test.each(PAGES.map(([page], index) => ({ page, index })))("$page asks as often with 300 rows more", ({ index }) => {
  expect(many[index]).toBe(few[index]);
});

/** 300 more of everything that a list is made of. */
async function grow(db: ReturnType<typeof owner>): Promise<void> {
  const workshop = orgId("vennick");
  const college = orgId("merrowdale");
  const mentor = personId("sunniva");
  const tag = randomBytes(3).toString("hex");
  const numbers = Array.from({ length: ROWS }, (_, index) => index);
  const insert = async (table: string, row: (n: number) => object): Promise<string[]> =>
    (await db(table).insert(numbers.map(row)).returning("*")).map((made: { id: string }) => made.id);

  const people = await insert("people", (n) => ({ name: `Apprentice ${n}`, email: `${tag}-${n}@people.test`, date_of_birth: "2005-01-01" }));
  const agreement = (n: number) => ({
    apprentice_id: people[n],
    workshop_id: workshop,
    college_id: college,
    qualification: "Light vehicle technician",
    starts_on: "2025-01-01",
    planned_end_on: "2099-01-01",
    contracted_minutes: 0,
  });
  await insert("memberships", (n) => ({ organisation_id: workshop, person_id: people[n], roles: ["apprentice"] }));
  const agreements = await insert("training_agreements", agreement);
  const cohorts = await insert("cohorts", (n) => ({ organisation_id: college, name: `Cohort ${n}`, starts_on: "2025-01-01" }));
  await insert("cohort_members", (n) => ({ organisation_id: college, cohort_id: n % 2 ? COHORT : cohorts[n], agreement_id: agreements[n] }));

  const files = await insert("files", (n) => ({ organisation_id: workshop, store_key: `${tag}/${n}`, media_type: "video/mp4", size_bytes: 1 }));
  await insert("recordings", (n) => ({
    organisation_id: workshop,
    title: `Film ${n}`,
    recorded_by: mentor,
    source_file_id: files[n],
    state: "ready",
    duration_ms: 1000,
  }));
  const modules = await insert("modules", (n) => ({ organisation_id: workshop, title: `Module ${n}`, pass_share: 0.8, created_by: mentor }));
  const template = await db("module_revisions").where({ module_id: MODULE }).first();
  const revisions = await insert("module_revisions", (n) => ({ ...template, id: randomUUID(), module_id: modules[n], content: JSON.stringify(template.content) }));
  await insert("assignments", (n) => ({
    organisation_id: workshop,
    module_id: modules[n],
    module_revision_id: revisions[n],
    apprentice_id: personId("asha"),
    assigned_by: mentor,
    due_on: "2099-01-01",
  }));

  const sample = await db("task_revisions as r").join("tasks as t", "t.id", "r.task_id").select("r.*", "t.draft").first();
  const tasks = await insert("tasks", () => ({ organisation_id: sample.organisation_id, draft: JSON.stringify(sample.draft), created_by: sample.published_by }));
  const { draft: _, ...revision } = sample;
  const taskRevisions = await insert("task_revisions", (n) => ({ ...revision, id: randomUUID(), number: 1, task_id: tasks[n], content: JSON.stringify(revision.content) }));
  await insert("practice_runs", (n) => ({ organisation_id: workshop, apprentice_id: people[n], task_id: tasks[n], done_on: "2026-01-01", vehicle: "V", minutes: 5 }));
  await insert("readiness", (n) => ({ organisation_id: workshop, apprentice_id: people[n], task_id: tasks[n] }));
  const sheet = (n: number, state: object) => ({
    organisation_id: college,
    apprentice_id: n % 3 ? people[n] : personId("asha"),
    workshop_id: workshop,
    assessor_id: personId("idris"),
    task_id: tasks[n],
    task_revision_id: taskRevisions[n],
    vehicle: "V",
    job_card_number: "J",
    idempotency_key: randomUUID(),
    ...state,
  });
  await insert("observations", (n) => sheet(n, {}));
  const signed = await insert("observations", (n) => sheet(n, { state: "signed", ended_at: new Date() }));
  const { leaf_index } = await db("ledger_entries").where({ organisation_id: college }).first();
  await insert("sign_offs", (n) => {
    const { vehicle: _v, job_card_number: _j, idempotency_key: _k, ...of } = sheet(n, {});
    return { ...of, observation_id: signed[n], outcome: "not_yet", reasons: JSON.stringify({ outcome: [], cap: { level: 5, reasons: [] } }), leaf_index };
  });
}
