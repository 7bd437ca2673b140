import { STEP_FACTS } from "@/db/seeds/demo/films/auxiliary-belt/facts";
import timings from "@/db/seeds/demo/films/auxiliary-belt/media/timings.json";
import { questions } from "@/db/seeds/demo/films/auxiliary-belt/questions";
import { markOut } from "@/db/seeds/demo/films/marking-out";

/** Steps with their facts, and questions, at the times of the film that is shipped. */
export const markingOut = markOut(timings, STEP_FACTS, questions);
