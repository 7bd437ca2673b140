import { fileURLToPath } from "node:url";
import { markingOut as beltMarkingOut } from "@/db/seeds/demo/films/auxiliary-belt/marking-out";
import beltTimings from "@/db/seeds/demo/films/auxiliary-belt/media/timings.json";
import { script as beltScript } from "@/db/seeds/demo/films/auxiliary-belt/script";
import { markingOut as discsMarkingOut } from "@/db/seeds/demo/films/front-brake-discs/marking-out";
import discsTimings from "@/db/seeds/demo/films/front-brake-discs/media/timings.json";
import { script as discsScript } from "@/db/seeds/demo/films/front-brake-discs/script";
import type { FilmScript, FilmTimings, MarkingOut } from "@/db/seeds/demo/films/types";

export type DemoFilm = { key: string; script: FilmScript; timings: FilmTimings; markingOut: MarkingOut };

/** The films that the demo ships, as recordings: script, times and what is marked out on them. */
export const DEMO_FILMS: DemoFilm[] = [
  { key: discsScript.key, script: discsScript, timings: discsTimings, markingOut: discsMarkingOut },
  { key: beltScript.key, script: beltScript, timings: beltTimings, markingOut: beltMarkingOut },
];

/** The files that are shipped for each film. 720p is what was filmed, 480p its smaller rendition. */
export const MEDIA_FILES = ["720p.mp4", "480p.mp4", "poster.jpg", "storyboard.jpg", "storyboard.vtt", "captions.vtt", "timings.json"] as const;

/** Where a shipped file lies on this machine. */
export const mediaPath = (film: string, file: (typeof MEDIA_FILES)[number]): string =>
  fileURLToPath(new URL(`./${film}/media/${file}`, import.meta.url));
