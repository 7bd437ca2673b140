import { STEP_FACTS } from "@/db/seeds/demo/films/front-brake-discs/facts";
import timings from "@/db/seeds/demo/films/front-brake-discs/media/timings.json";
import { questions } from "@/db/seeds/demo/films/front-brake-discs/questions";
import { markOut } from "@/db/seeds/demo/films/marking-out";

/** Steps with their facts, and questions, at the times of the film that is shipped. */
export const markingOut = markOut(timings, STEP_FACTS, questions);
