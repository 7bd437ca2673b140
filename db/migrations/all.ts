import * as createFoundation from "@/db/migrations/20261201090000_create_foundation";
import * as createPeople from "@/db/migrations/20261201090100_create_people";
import * as createTraining from "@/db/migrations/20261201090200_create_training";
import * as createRecordings from "@/db/migrations/20261201090300_create_recordings";
import * as createTasksAndModules from "@/db/migrations/20261201090400_create_tasks_and_modules";
import * as createSignOff from "@/db/migrations/20261201090500_create_sign_off";
import * as createMail from "@/db/migrations/20261201090600_create_mail";
import type { Knex } from "knex";

/** Every migration by its file's name, in order. A test holds this list to the folder. */
export const MIGRATIONS: Record<string, Knex.Migration> = {
  "20261201090000_create_foundation": createFoundation,
  "20261201090100_create_people": createPeople,
  "20261201090200_create_training": createTraining,
  "20261201090300_create_recordings": createRecordings,
  "20261201090400_create_tasks_and_modules": createTasksAndModules,
  "20261201090500_create_sign_off": createSignOff,
  "20261201090600_create_mail": createMail,
};
