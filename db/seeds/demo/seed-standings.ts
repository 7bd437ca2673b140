import { moduleId, moduleRevisionId, orgId, personId, taskId, taskRevisionId } from "@/db/seeds/demo/ids";
import type { Knex } from "knex";
import { demoId } from "@/db/seeds/demo/demo-id";
import { STAFF, APPRENTICES } from "@/db/seeds/demo/cast";
import { DEMO_FILMS, mediaPath } from "@/db/seeds/demo/films/films";
import { plannedStandings, WORKSHOP_OF, type PlannedStanding } from "@/db/seeds/demo/history";
import type { LedgerWriter } from "@/db/seeds/demo/ledger-writer";
import { dayFrom } from "@/db/seeds/demo/seed-cast";
import { CHANGED_DAYS_AGO, CHANGED_TASK, type PutFile } from "@/db/seeds/demo/seed-work";
import { metSheet, notYetSheet } from "@/db/seeds/demo/sheets";
import { DEMO_TASKS, type DemoTaskKey } from "@/db/seeds/demo/tasks";
import { addMonths } from "@/lib/core/dates";
import { signOffEntry } from "@/lib/core/ledger/sign-off-entry";
import { revisionHash } from "@/lib/core/modules/revision-hash";
import { levelCap } from "@/lib/core/tasks/level-cap";
import { observationOutcome } from "@/lib/core/tasks/observation-outcome";
import type { CriterionMark, Level } from "@/lib/core/tasks/types";

const ASSESSORS = ["idris", "petra"] as const;
const NAME_OF = new Map([...STAFF, ...APPRENTICES].map((person) => [person.key, person.name]));
const nameOf = (key: string): string => NAME_OF.get(key) ?? key;

type Pair = { apprentice: string; task: DemoTaskKey; planned: PlannedStanding };
/** One observation that was signed in the past. `level` null: it came to "not yet". */
type PastSheet = Pair & { daysAgo: number; assessor: string; vehicle: string; level: Level | null; withdrawn: boolean };

const VEHICLES_AT = { vennick: ["DEMO 001", "DEMO 002", "DEMO 003"], saltmarsh: ["DEMO 004", "DEMO 005", "DEMO 006"] } as const;

/** Months of practice, evidence and signed observations, so that each person stands on each task as planned. */
export async function seedStandings(trx: Knex.Transaction, day: string, ledger: LedgerWriter, putFile: PutFile): Promise<void> {
  const pairs = plannedStandings();
  for (const pair of pairs) {
    await seedProgress(trx, day, pair);
    await seedEvidence(trx, day, pair, putFile);
  }
  const sheets = pairs.flatMap((pair) => pastSheets(pair)).toSorted((a, b) => b.daysAgo - a.daysAgo);
  for (const sheet of sheets) await seedSheet(trx, day, sheet, ledger);
}

/** Days since the last of a person's observations on a task: spread out, and always the same for the same pair. */
function spread(pair: Pair, from: number, to: number): number {
  const seed = Number.parseInt(demoId(`spread/${pair.apprentice}/${pair.task}`).slice(0, 6), 16);
  return from + (seed % (to - from));
}

function pastSheets(pair: Pair): PastSheet[] {
  const { held, next } = pair.planned;
  const vehicles = VEHICLES_AT[WORKSHOP_OF[pair.apprentice] ?? "vennick"];
  const rule = DEMO_TASKS[pair.task].rule;
  const sheets: PastSheet[] = [];
  if (held) {
    // A level that ran out was given longer ago than it lasts.
    const last = held.ranOut ? rule.currencyMonths * 31 + 20 : spread(pair, CHANGED_DAYS_AGO + 10, 170);
    const needed = Math.max(1, ...rule.levelNeeds.filter((need) => need.level <= held.level).map((need) => need.observations));
    const met: { vehicle: string; assessorId: string }[] = [];
    for (let index = 0; index < needed; index += 1) {
      const assessor = ASSESSORS[index % 2] ?? "idris";
      const vehicle = vehicles[index % vehicles.length] ?? "DEMO 001";
      met.push({ vehicle, assessorId: assessor });
      const { level: cap } = levelCap({ rule, prompted: false, metObservations: met, licences: [], ageYears: 30 });
      const level = Math.min(cap, held.level) as Level;
      const isLast = index === needed - 1;
      sheets.push({ ...pair, daysAgo: last + (needed - 1 - index) * 24, assessor, vehicle, level, withdrawn: isLast && held.withdrawn });
    }
  }
  if (next === "not_yet") {
    sheets.push({ ...pair, daysAgo: spread(pair, 3, 18), assessor: "idris", vehicle: vehicles[0], level: null, withdrawn: false });
  }
  return sheets;
}

async function seedSheet(trx: Knex.Transaction, day: string, sheet: PastSheet, ledger: LedgerWriter): Promise<void> {
  const content = DEMO_TASKS[sheet.task];
  const workshop = WORKSHOP_OF[sheet.apprentice] ?? "vennick";
  const merrowdale = orgId("merrowdale");
  const name = `${sheet.apprentice}/${sheet.task}/${sheet.daysAgo}`;
  const observationId = demoId(`observation/${name}`);
  const signedOn = dayFrom(day, -sheet.daysAgo);
  const [startedAt, signedAt] = [`${signedOn}T09:10:00.000Z`, `${signedOn}T11:05:00.000Z`];
  const number = sheet.task === CHANGED_TASK && sheet.daysAgo < CHANGED_DAYS_AGO ? 2 : 1;
  const instruments = new Map(
    [
      ["torque wrench", "TW-2"],
      ["micrometer", "MIC-4"],
      ["dial gauge", "DG-2"],
      ["multimeter", "MM-1"],
      ["pressure tester", "PT-1"],
    ].map(([kind = "", label = ""]) => [kind, demoId(`instrument/${workshop}/${label}`)]),
  );
  const marks = sheet.level === null ? notYetSheet(content.criteria, instruments) : metSheet(content.criteria, instruments);
  const outcome = observationOutcome(content, marks, null);
  if ((outcome.outcome === "met") !== (sheet.level !== null)) throw new Error(`The sheet of ${name} does not come to what it was made for.`);
  const feedback = sheet.level === null ? "Set the wrench, read it back aloud, then tighten. Show me again next week." : "Calm work, in the right order.";
  const vehicle = sheet.vehicle;
  const jobCardNumber = `DJ-${Number.parseInt(observationId.slice(0, 4), 16)}`;

  await trx("observations").insert({
    id: observationId,
    organisation_id: merrowdale,
    apprentice_id: personId(sheet.apprentice),
    workshop_id: orgId(workshop),
    assessor_id: personId(sheet.assessor),
    task_id: taskId(sheet.task),
    task_revision_id: taskRevisionId(sheet.task, number),
    vehicle,
    job_card_number: jobCardNumber,
    state: "signed",
    started_at: startedAt,
    ended_at: signedAt,
    idempotency_key: demoId(`press/${name}`),
  });
  await trx("observation_marks").insert(marks.map((mark) => markRow(merrowdale, observationId, mark, signedAt)));
  const entry = signOffEntry({
    observationId,
    taskId: taskId(sheet.task),
    taskRevision: number,
    taskContentHash: revisionHash(content),
    outcome: outcome.outcome,
    level: sheet.level,
    stoppedForSafety: false,
    marks,
    startedAt,
    apprentice: { personId: personId(sheet.apprentice), name: nameOf(sheet.apprentice) },
    assessor: { personId: personId(sheet.assessor), name: nameOf(sheet.assessor) },
    vehicle,
    jobCardNumber,
    feedback,
  });
  const signOffId = demoId(`sign-off/${name}`);
  await trx("sign_offs").insert({
    id: signOffId,
    organisation_id: merrowdale,
    observation_id: observationId,
    apprentice_id: personId(sheet.apprentice),
    workshop_id: orgId(workshop),
    assessor_id: personId(sheet.assessor),
    task_id: taskId(sheet.task),
    task_revision_id: taskRevisionId(sheet.task, number),
    outcome: outcome.outcome,
    level: sheet.level,
    feedback,
    reasons: JSON.stringify({ outcome: outcome.reasons, cap: { level: sheet.level ?? 1, reasons: [] } }),
    signed_at: signedAt,
    current_until: sheet.level === null ? null : addMonths(signedOn, content.rule.currencyMonths),
    leaf_index: await ledger.append(merrowdale, entry, signedAt),
  });
  if (sheet.withdrawn) await seedWithdrawal(trx, signOffId, sheet, signedAt, ledger);
}

async function seedWithdrawal(trx: Knex.Transaction, signOffId: string, sheet: PastSheet, signedAt: string, ledger: LedgerWriter): Promise<void> {
  const reason = "The pressure tester was found out of tolerance at its next calibration.";
  const madeAt = signedAt.replace("T11:05", "T16:40");
  const entry = {
    kind: "withdrawal" as const,
    subject: { signOffId, taskId: taskId(sheet.task) },
    personal: [
      { personId: personId("calum"), label: "withdrawn_by", value: "Calum Ravensby" },
      { personId: personId(sheet.apprentice), label: "reason", value: reason },
    ],
  };
  const leafIndex = await ledger.append(orgId("merrowdale"), entry, madeAt);
  await trx("sign_off_changes").insert({
    organisation_id: orgId("merrowdale"),
    sign_off_id: signOffId,
    kind: "withdrawal",
    reason,
    made_by: personId("calum"),
    made_at: madeAt,
    leaf_index: leafIndex,
  });
}

function markRow(organisationId: string, observationId: string, mark: CriterionMark, at: string) {
  return {
    organisation_id: organisationId,
    observation_id: observationId,
    criterion_key: mark.key,
    mark: mark.mark,
    reading_value: mark.reading?.value ?? null,
    reading_unit: mark.reading?.unit ?? null,
    instrument_id: mark.reading?.instrumentId ?? null,
    prompts: mark.prompts,
    remark: mark.remark,
    updated_at: at,
  };
}

/** What was learned and practised, and who waits to be seen. */
async function seedProgress(trx: Knex.Transaction, day: string, pair: Pair): Promise<void> {
  const { apprentice, task, planned } = pair;
  const workshop = WORKSHOP_OF[apprentice] ?? "vennick";
  await seedLearning(trx, day, pair, workshop);
  const base = { organisation_id: orgId(workshop), apprentice_id: personId(apprentice), task_id: taskId(task) };
  const runs = planned.held ? 2 : planned.next === "practising" ? 1 : ["ready", "booked", "not_yet"].includes(planned.next) ? 3 : 0;
  const mentor = workshop === "vennick" ? "sunniva" : "harriet";
  for (let index = 0; index < runs; index += 1) {
    const daysAgo = planned.held ? 200 + index * 9 : 6 + index * 5;
    const confirmed = planned.held !== null || index > 0;
    await trx("practice_runs").insert({
      ...base,
      done_on: dayFrom(day, -daysAgo),
      vehicle: VEHICLES_AT[workshop][index % 2],
      job_card_number: `DJ-${4100 + index}`,
      minutes: 60 + 15 * index,
      note: index === 0 ? "Slower than I want, but in order." : "",
      confirmed_by: confirmed ? personId(mentor) : null,
      confirmed_at: confirmed ? `${dayFrom(day, -daysAgo + 1)}T08:00:00Z` : null,
    });
  }
  if (planned.next !== "ready" && planned.next !== "booked") return;
  const waited = spread(pair, 2, 24);
  await trx("readiness").insert({
    ...base,
    declared_at: `${dayFrom(day, -waited)}T15:20:00Z`,
    ...(planned.next === "booked" ? { booked_for: `${dayFrom(day, 3)}T09:00:00Z`, booked_by: personId("petra") } : {}),
  });
}

/** Who waits to be seen has added the photos that the task asks for: stills of the demo's own drawn films. */
async function seedEvidence(trx: Knex.Transaction, day: string, pair: Pair, putFile: PutFile): Promise<void> {
  if (pair.planned.next !== "ready" && pair.planned.next !== "booked") return;
  const organisationId = orgId(WORKSHOP_OF[pair.apprentice] ?? "vennick");
  for (let index = 0; index < DEMO_TASKS[pair.task].rule.evidencePhotos; index += 1) {
    const film = DEMO_FILMS[index % DEMO_FILMS.length]?.key ?? "front-brake-discs";
    const fileId = demoId(`evidence/${pair.apprentice}/${pair.task}/${index}`);
    const { storeKey, sizeBytes } = await putFile({ organisationId, subjectId: fileId, kind: "evidence" }, mediaPath(film, "poster.jpg"), "image/jpeg");
    const createdAt = `${dayFrom(day, -25 + index)}T15:00:00Z`;
    await trx("files").insert({ id: fileId, organisation_id: organisationId, store_key: storeKey, media_type: "image/jpeg", size_bytes: sizeBytes, created_by: personId(pair.apprentice), created_at: createdAt });
    await trx("evidence").insert({
      organisation_id: organisationId,
      apprentice_id: personId(pair.apprentice),
      task_id: taskId(pair.task),
      kind: "photo",
      file_id: fileId,
      note: "A still from a drawn film, for the demo",
      created_at: createdAt,
    });
  }
}

/** The workshop's modules are given to its apprentices; who may work on the task has learned it. */
async function seedLearning(trx: Knex.Transaction, day: string, pair: Pair, workshop: string): Promise<void> {
  const film = DEMO_FILMS.find((candidate) => candidate.key === pair.task);
  if (!film || workshop !== "vennick") return;
  const known = pair.planned.next !== "not_open";
  const assignmentId = demoId(`assignment/${pair.apprentice}/${film.key}`);
  const knownAt = `${dayFrom(day, -(pair.planned.held ? 240 : 30))}T14:00:00Z`;
  await trx("assignments").insert({
    id: assignmentId,
    organisation_id: orgId("vennick"),
    module_id: moduleId(film.key),
    module_revision_id: moduleRevisionId(film.key),
    apprentice_id: personId(pair.apprentice),
    assigned_by: personId("sunniva"),
    due_on: dayFrom(day, known ? -20 : 9),
    created_at: `${dayFrom(day, -(pair.planned.held ? 260 : 45))}T08:00:00Z`,
    knowledge_met_at: known ? knownAt : null,
  });
  await seedAnswers(trx, assignmentId, pair, film.markingOut, known ? knownAt : `${dayFrom(day, -2)}T17:30:00Z`, known);
  const recording = { assignment_id: assignmentId, recording_id: demoId(`recording/${film.key}`) };
  const playedTo = known ? film.timings.durationMs : (film.markingOut.steps[0]?.endMs ?? 0);
  await trx("played_spans").insert({ ...recording, played: `{[0,${playedTo})}` });
}

/** First answers, some of them wrong and right the second time; of a module that isn't known yet, only those of its first step. */
async function seedAnswers(
  trx: Knex.Transaction,
  assignmentId: string,
  pair: Pair,
  { steps, questions }: { steps: { id: string }[]; questions: { id: string; stepId: string }[] },
  at: string,
  known: boolean,
): Promise<void> {
  const asked = known ? questions : questions.filter((question) => question.stepId === steps[0]?.id);
  for (const [index, question] of asked.entries()) {
    const stumbles = (Number.parseInt(demoId(`stumble/${pair.apprentice}/${question.id}`).slice(0, 4), 16) + index) % 4 === 0;
    for (const [attempt, isRight] of (stumbles ? [false, true] : [true]).entries()) {
      const id = demoId(`attempt/${assignmentId}/${question.id}/${attempt}`);
      const answeredAt = new Date(new Date(at).getTime() - (asked.length - index) * 60_000 + attempt * 20_000).toISOString();
      const own = { organisation_id: orgId("vennick"), assignment_id: assignmentId, question_id: question.id };
      await trx("question_attempts").insert({ id, ...own, number: attempt + 1, id_map: "{}", issued_at: answeredAt });
      await trx("answers").insert({ attempt_id: id, ...own, given: JSON.stringify({ kind: "demo" }), is_right: isRight, answered_at: answeredAt });
    }
  }
}
