import { z } from "zod";

/** What neither PostgreSQL's text nor JSON that others read can carry: NUL and other control characters, and halves of surrogate pairs. */
const UNKEEPABLE = /[\u0000-\u0008\u000B\u000C\u000E-\u001F\u007F\uFFFE\uFFFF]|[\uD800-\uDFFF]/u;

/** Text as people type it, trimmed, at most `most` UTF-16 units, free of characters that can't be kept. */
export const plainText = (most: number) =>
  z
    .string()
    .trim()
    .max(most)
    .refine((text) => !UNKEEPABLE.test(text), "This holds a character that can’t be kept.");

/** The same on one line: names and titles. */
export const lineOfText = (most: number) => plainText(most).refine((text) => !/[\r\n]/.test(text), "This is one line.");
