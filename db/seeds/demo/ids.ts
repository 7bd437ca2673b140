import type { OrganisationKey } from "@/db/seeds/demo/cast";
import { demoId } from "@/db/seeds/demo/demo-id";
import type { DemoTaskKey } from "@/db/seeds/demo/tasks";

// Ids of the demo's things by the keys that its files use: always the same, so that addresses, tests and pictures can rely on them.
export const orgId = (key: OrganisationKey): string => demoId(`organisation/${key}`);
export const personId = (key: string): string => demoId(`person/${key}`);
export const taskId = (key: DemoTaskKey): string => demoId(`task/${key}`);
export const taskRevisionId = (key: DemoTaskKey, number: number): string => demoId(`task/${key}/revision/${number}`);
export const moduleId = (film: string): string => demoId(`module/${film}`);
export const moduleRevisionId = (film: string): string => demoId(`module/${film}/revision/1`);
export const recordingId = (film: string): string => demoId(`recording/${film}`);
