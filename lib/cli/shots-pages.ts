import { moduleId, personId, recordingId, taskId } from "@/db/seeds/demo/ids";
import { demoId } from "@/db/seeds/demo/demo-id";

export type ShotPage = { name: string; path: string };
/** Pages of each role in the demo, with the address that signs in for them. */
export type ShotRole = { role: string; email: string | null; pages: ShotPage[] };

const page = (name: string, path: string): ShotPage => ({ name, path });
const film = "front-brake-discs";

/** Every page of the product, as each role. A test holds this to the pages that exist. */
export const SHOT_ROLES: ShotRole[] = [
  {
    role: "public",
    email: null,
    pages: [page("front", "/"), page("sign-in", "/sign-in"), page("forgotten", "/forgotten"), page("new-password", "/new-password"), page("join", "/join"), page("legend", "/legend")],
  },
  {
    role: "mentor",
    email: "sunniva@demo.invalid",
    pages: [
      page("today", "/o/vennick/today"),
      page("recordings", "/o/vennick/recordings"),
      page("recording", `/o/vennick/recordings/${recordingId(film)}`),
      page("bench", `/o/vennick/recordings/${recordingId(film)}/bench`),
      page("modules", "/o/vennick/modules"),
      page("module", `/o/vennick/modules/${moduleId(film)}`),
      page("tasks", "/o/vennick/tasks"),
      page("task", `/o/vennick/tasks/${taskId(film)}`),
      page("apprentices", "/o/vennick/apprentices"),
      page("account", "/account"),
    ],
  },
  {
    role: "apprentice",
    email: "asha@demo.invalid",
    pages: [
      page("places", "/o"),
      page("today", "/o/vennick/today"),
      page("learn", "/o/vennick/learn"),
      page("learn-module", `/o/vennick/learn/${demoId(`assignment/asha/${film}`)}`),
      page("practice", "/o/vennick/practice"),
      page("practice-task", `/o/vennick/practice/${taskId(film)}`),
      page("record", "/o/vennick/record"),
    ],
  },
  {
    role: "assessor",
    email: "idris@demo.invalid",
    pages: [
      page("today", "/o/merrowdale/today"),
      page("ready", "/o/merrowdale/ready"),
      page("observations", "/o/merrowdale/observations"),
      page("observation", "/o/merrowdale/observations/:open"),
      page("sign-offs", "/o/merrowdale/sign-offs"),
      page("sign-off", "/o/merrowdale/sign-offs/:newest"),
    ],
  },
  {
    role: "liaison",
    email: "deepa@demo.invalid",
    pages: [
      page("today", "/o/merrowdale/today"),
      page("cohorts", "/o/merrowdale/cohorts"),
      page("cohort", `/o/merrowdale/cohorts/${demoId("cohort/lv-26")}`),
      page("cohort-table", `/o/merrowdale/cohorts/${demoId("cohort/lv-26")}?show=table`),
    ],
  },
  {
    role: "manager",
    email: "marguerite@demo.invalid",
    pages: [page("today", "/o/vennick/today?as=manager"), page("limits", "/o/vennick/limits"), page("people", "/o/vennick/people")],
  },
  { role: "verifier", email: "calum@demo.invalid", pages: [page("today", "/o/merrowdale/today"), page("sign-offs", "/o/merrowdale/sign-offs")] },
];

/** An apprentice who is ready on a task: the assessor's sheet is opened for them, so that it can be seen. */
export const OPEN_SHEET = { apprenticeId: personId("asha"), taskId: taskId("road-wheel"), vehicle: "DEMO 002", jobCardNumber: "DJ-5001" };
