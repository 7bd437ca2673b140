import { z } from "zod";

export const moduleDraftSchema = z.object({
  /** The version that the mentor's page was showing; another one means that somebody saved in between. */
  version: z.int().positive(),
  title: z.string().trim().min(1, "Give the module a title.").max(200),
  summary: z.string().trim().max(2000),
  passShare: z.number().min(0).max(1),
  stepIds: z.array(z.uuid()).max(200).refine((ids) => new Set(ids).size === ids.length, "A step can stand in a module once."),
  taskIds: z.array(z.uuid()).max(50).refine((ids) => new Set(ids).size === ids.length, "A task can be opened once."),
});
export type ModuleDraftInput = z.infer<typeof moduleDraftSchema>;

export const newModuleSchema = z.object({
  title: z.string().trim().min(1, "Give the module a title.").max(200),
  /** Its steps become the module's first steps. */
  recordingId: z.uuid().nullable(),
});
export type NewModuleInput = z.infer<typeof newModuleSchema>;

export const publishModuleSchema = z.object({ version: z.int().positive(), workChanged: z.boolean() });
export type PublishModuleInput = z.infer<typeof publishModuleSchema>;

export const giveModuleSchema = z.object({
  apprenticeIds: z.array(z.uuid()).min(1, "Choose at least one apprentice.").max(200),
  dueOn: z.iso.date("Give the day by which it should be known."),
});
export type GiveModuleInput = z.infer<typeof giveModuleSchema>;
