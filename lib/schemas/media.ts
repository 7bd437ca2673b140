import { z } from "zod";

/** Signed addresses of one recording's files; null where a file isn't made yet. Valid for hours; ask again when one has run out. */
export const mediaSchema = z.object({
  recordingId: z.uuid(),
  durationMs: z.int().nullable(),
  p480: z.string().nullable(),
  p720: z.string().nullable(),
  poster: z.string().nullable(),
  storyboardSheet: z.string().nullable(),
  storyboardTrack: z.string().nullable(),
  captions: z.array(z.object({ language: z.string(), vtt: z.string() })),
});
export type Media = z.infer<typeof mediaSchema>;
