import type { Picture } from "@/lib/cli/film/moment";
import { BELT } from "@/lib/cli/film/pictures/belt";
import { DISCS_FIT } from "@/lib/cli/film/pictures/discs-fit";
import { DISCS_LOOK } from "@/lib/cli/film/pictures/discs-look";
import { DISCS_STRIP } from "@/lib/cli/film/pictures/discs-strip";

/** Every drawing by the name that scripts give it. */
export const PICTURES: Record<string, Picture> = { ...DISCS_LOOK, ...DISCS_STRIP, ...DISCS_FIT, ...BELT };
