import { ROLES, type Role } from "@/lib/core/roles";

/** One place on the rail: its label and its address behind `/o/[org]`. */
export type Place = { label: string; path: `/${string}` };

const TODAY: Place = { label: "Today", path: "/today" };
const SIGN_OFFS: Place = { label: "Sign-offs", path: "/sign-offs" };

/** Where each role works: at most five places. For showing the way only; whether somebody may go there is decided at the place. */
export const PLACES: Record<Role, readonly Place[]> = {
  mentor: [
    TODAY,
    { label: "Recordings", path: "/recordings" },
    { label: "Modules", path: "/modules" },
    { label: "Tasks", path: "/tasks" },
    { label: "Apprentices", path: "/apprentices" },
  ],
  apprentice: [
    TODAY,
    { label: "Modules", path: "/learn" },
    { label: "Tasks", path: "/practice" },
    { label: "Record", path: "/record" },
  ],
  assessor: [TODAY, { label: "Ready", path: "/ready" }, { label: "Observations", path: "/observations" }, SIGN_OFFS],
  liaison: [TODAY, { label: "Cohorts", path: "/cohorts" }, SIGN_OFFS],
  manager: [TODAY, { label: "Work limits", path: "/limits" }, { label: "People", path: "/people" }, SIGN_OFFS],
  verifier: [TODAY, SIGN_OFFS],
};

const isAt = (path: string, place: Place) => path === place.path || path.startsWith(`${place.path}/`);

/** One line of the rail as it stands on a page. `href` is an address behind `/o/[org]`. */
export type RailPlace = { label: string; href: string; current: boolean };

/**
 * The rail of somebody with these roles on this page: that of the first of their roles that has the place. Where several of their roles
 * share a place, the address says which one was meant (`?as=assessor`), so that going to Today does not change the rail.
 *
 * @param roles  what the person is at the organisation; the order does not matter.
 * @param path   address behind `/o/[org]`, such as `/modules/0192…`.
 * @param as     the address's `as`; anything that is not one of `roles`, or has no such place while another role has, is passed over.
 */
export function placesFor(roles: Iterable<Role>, path: string, as?: string | null): { role: Role | undefined; places: RailPlace[] } {
  const held = new Set(roles);
  const mine = ROLES.filter((role) => held.has(role));
  const fitting = mine.filter((role) => PLACES[role].some((place) => isAt(path, place)));
  const candidates = fitting.length > 0 ? fitting : mine;
  const role = candidates.find((candidate) => candidate === as) ?? candidates[0];
  if (!role) return { role, places: [] };
  return { role, places: PLACES[role].map((place) => ({ label: place.label, href: placeHref(mine, role, place), current: isAt(path, place) })) };
}

/** A place's address behind `/o/[org]`, with the role where several of `roles` share the place. */
function placeHref(roles: readonly Role[], role: Role, place: Place): string {
  const shared = roles.filter((other) => PLACES[other].some((each) => each.path === place.path)).length > 1;
  return shared ? `${place.path}?as=${role}` : place.path;
}

/** Where somebody with these roles begins when they go to work as `role`: Today, told apart where they have several roles. */
export function beginningOf(roles: Iterable<Role>, role: Role): string {
  return placeHref([...new Set(roles)], role, TODAY);
}
