import type { Actor } from "@/lib/core/roles";
import { CALLERS, type Caller, type Place, type World } from "../support/api-world";

export type Sent = { params?: Record<string, string>; query?: Record<string, string>; body?: unknown };
/** What a valid request is for this caller; arranges what it needs. */
export type Send = (world: World, caller: Actor | null) => Sent | Promise<Sent>;
/** A status, or "redirect" for a page. */
export type Answer = number | "redirect";
export type Row = { at: Place; gives: Record<Caller, Answer>; send: Send };

type Gives = Partial<Record<Caller, Answer>>;
const nothing: Send = () => ({});
const all = (answer: Answer): Record<Caller, Answer> => Object.fromEntries(CALLERS.map((caller) => [caller, answer])) as Record<Caller, Answer>;

/** A door of an organisation: who is not named is refused, and from outside it isn't there. */
export const members = (gives: Gives, send: Send = nothing, at: Place = "vennick"): Row => ({
  at,
  gives: { ...all(403), anonymous: 401, outsider: 404, ...gives },
  send,
});
/** The same at the college. */
export const atCollege = (gives: Gives, send: Send = nothing): Row => members(gives, send, "merrowdale");
/** A door without an organisation. */
export const everybody = (answer: Answer, send: Send = nothing, gives: Gives = {}): Row => ({ at: "vennick", gives: { ...all(answer), ...gives }, send });

/** A page of an organisation: what somebody may not see is not there. */
export const page = (gives: Gives, send: Send = nothing, at: Place = "vennick"): Row => ({
  at,
  gives: { ...all(404), anonymous: "redirect", ...gives },
  send,
});
