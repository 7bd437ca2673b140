import { formatDay } from "@/lib/core/dates";
import type { Actor } from "@/lib/core/roles";
import { viewWaiting } from "@/lib/services/cohorts/view-cohort";
import { viewGiven } from "@/lib/services/learning/view-given";
import { viewModules } from "@/lib/services/modules/view-modules";
import { viewOpenSheets } from "@/lib/services/observations/view-open-sheets";
import { viewReady } from "@/lib/services/observations/view-ready";
import { viewPractice } from "@/lib/services/practice/view-practice";
import { viewSignOffs } from "@/lib/services/sign-offs/view-sign-offs";
import { viewApprentices } from "@/lib/services/workshop/view-apprentices";
import { viewWorkshopPlate } from "@/lib/services/workshop/view-workshop-plate";

/** One thing to do, with its reason. `href` stands behind `/o/[org]`. */
export type TodayItem = { title: string; reason: string; href: `/${string}` };

/** What to do next, the most pressing first, from each of the person's roles here. */
export async function viewToday(actor: Actor): Promise<TodayItem[]> {
  const parts: TodayItem[][] = [];
  if (actor.roles.has("apprentice")) parts.push(await forApprentice(actor));
  if (actor.roles.has("assessor")) parts.push(await forAssessor(actor));
  if (actor.roles.has("mentor")) parts.push(await forMentor(actor));
  if (actor.roles.has("liaison")) parts.push(await forLiaison(actor));
  if (actor.roles.has("manager") && actor.organisation.kind === "workshop") parts.push(await forManager(actor));
  if (actor.roles.has("verifier")) parts.push(await forVerifier(actor));
  return parts.flat();
}

const count = (n: number, one: string, many: string): string => `${n} ${n === 1 ? one : many}`;

async function forApprentice(actor: Actor): Promise<TodayItem[]> {
  const given = (await viewGiven(actor)).filter((module) => !module.knowledgeMetAt);
  const tasks = await viewPractice(actor);
  return [
    ...given.map((module): TodayItem => ({
      title: `Go on with “${module.title}”`,
      reason: `To be known by ${formatDay(module.dueOn)}. ${module.right} of ${module.questions} questions right so far.`,
      href: `/learn/${module.assignmentId}`,
    })),
    ...tasks
      .filter((task) => task.standing.held.kind === "recheck_due" && task.readySince === null)
      .map((task): TodayItem => ({ title: `${task.title}: look again`, reason: "Your sign-off ran out or the work changed. Ask to be seen again.", href: `/practice/${task.taskId}` })),
    ...tasks
      .filter((task) => task.standing.next === "not_yet" && task.readySince === null)
      .map((task): TodayItem => ({ title: `${task.title}: have another go`, reason: "Last seen as not yet. The reasons and what to do stand there.", href: `/practice/${task.taskId}` })),
    ...tasks
      .filter((task) => task.standing.next === "practising")
      .map((task): TodayItem => ({
        title: task.missing.length === 0 ? `${task.title}: say that you are ready` : `${task.title}: go on practising`,
        reason: task.missing.length === 0 ? "Everything is there." : task.missing.join(" "),
        href: `/practice/${task.taskId}`,
      })),
  ];
}

async function forAssessor(actor: Actor): Promise<TodayItem[]> {
  const sheets = await viewOpenSheets(actor);
  const ready = (await viewReady(actor)).filter((item) => item.refused === null);
  const longest = ready.find((item) => item.bookedFor === null);
  return [
    ...sheets.map((sheet): TodayItem => ({
      title: `Go on with ${sheet.apprentice}: ${sheet.task}`,
      reason: `${sheet.filled} of ${sheet.criteria} criteria filled, not signed yet.`,
      href: `/observations/${sheet.observationId}`,
    })),
    ...ready
      .filter((item) => item.bookedFor !== null)
      .map((item): TodayItem => ({ title: `${item.apprentice}: ${item.task}`, reason: `Booked for ${formatDay(item.bookedFor?.slice(0, 10) ?? "")}, ${item.workshop}.`, href: "/ready" })),
    ...(longest
      ? [{ title: `${count(ready.length, "apprentice is", "apprentices are")} ready to be observed`, reason: `${longest.apprentice} has waited ${longest.waitedDays} days.`, href: "/ready" as const }]
      : []),
  ];
}

async function forMentor(actor: Actor): Promise<TodayItem[]> {
  const { runs } = await viewApprentices(actor);
  const { modules } = await viewModules(actor);
  const drafts = modules.filter((module) => module.newestNumber === null);
  const behind = modules.filter((module) => module.holders > module.knowing);
  return [
    ...(runs.length > 0
      ? [{ title: `${count(runs.length, "practice run waits", "practice runs wait")} for a witness`, reason: "One press each, if you saw it.", href: "/apprentices" as const }]
      : []),
    ...drafts.map((module): TodayItem => ({ title: `Publish “${module.title}”`, reason: "It is a draft: nobody can learn from it yet.", href: `/modules/${module.id}` })),
    ...behind.map((module): TodayItem => ({
      title: `See who is behind on “${module.title}”`,
      reason: `${module.holders - module.knowing} of ${module.holders} don’t know it yet.`,
      href: `/modules/${module.id}`,
    })),
  ];
}

async function forLiaison(actor: Actor): Promise<TodayItem[]> {
  return (await viewWaiting(actor)).map(({ id, name, waiting }): TodayItem => {
    const longest = waiting[0];
    return {
      title: name,
      reason: longest ? `${count(waiting.length, "apprentice waits", "apprentices wait")} to be observed; ${longest.name} longest, ${longest.waitedDays} days.` : "Nobody waits to be observed.",
      href: `/cohorts/${id}`,
    };
  });
}

async function forManager(actor: Actor): Promise<TodayItem[]> {
  const { rows } = await viewWorkshopPlate(actor);
  const due = rows.flatMap((row) => row.standings.filter((standing) => standing.held.kind === "recheck_due").map(() => row.name));
  return [
    due.length > 0
      ? { title: `${count(due.length, "re-check is", "re-checks are")} due`, reason: `${[...new Set(due)].join(", ")}: until then a level doesn’t count.`, href: "/limits" }
      : { title: "Work limits", reason: "Nothing is due for a re-check.", href: "/limits" },
  ];
}

async function forVerifier(actor: Actor): Promise<TodayItem[]> {
  const signOffs = await viewSignOffs(actor);
  const newest = signOffs[0];
  return newest
    ? [{ title: "Look through the newest sign-offs", reason: `The last was signed on ${formatDay(newest.signedAt.toISOString().slice(0, 10))} by ${newest.assessor}.`, href: "/sign-offs" }]
    : [];
}
