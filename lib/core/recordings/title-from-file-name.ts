import { formatDay } from "@/lib/core/dates";

const LONGEST = 200;

/** Names that cameras and phones give by themselves: a short word, then nothing but figures. */
const BY_A_CAMERA = /^(?:[a-z]{2,5}[ .-]?)?\d[\d\s.()-]*$/i;

/**
 * A first title for a recording, for the mentor to better: the file's name without its ending, or the day where a camera chose the name.
 * @param modifiedMs  when the file was last changed, ms since 1970
 */
export function titleFromFileName(fileName: string, modifiedMs: number): string {
  const name = fileName
    .replace(/\.[a-z0-9]{1,5}$/i, "")
    .replace(/[_\s]+/g, " ")
    .trim();
  const modified = new Date(modifiedMs);
  if (name !== "" && !BY_A_CAMERA.test(name)) return name.slice(0, LONGEST);
  if (Number.isNaN(modified.getTime())) return "Recording without a name";
  return `Recording of ${formatDay(modified.toISOString().slice(0, 10))}`;
}
