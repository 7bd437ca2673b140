import type { Plate } from "@/db/seeds/demo/films/types";

/** A value in large figures. @param remark  a few words under it, for example the limits */
export const value = (label: string, figure: string, unit: string, remark?: string): Plate =>
  remark === undefined ? { kind: "value", label, value: figure, unit } : { kind: "value", label, value: figure, unit, note: remark };

/** A few words. */
export const note = (text: string): Plate => ({ kind: "note", text });
