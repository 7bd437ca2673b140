import { expect, test } from "vitest";
import { beginningOf, PLACES, placesFor } from "@/lib/core/places";
import { ROLES } from "@/lib/core/roles";

test.each(ROLES)("the rail of a %s has Today first and at most five places, each once", (role) => {
  const paths = PLACES[role].map((place) => place.path);
  expect(paths[0]).toBe("/today");
  expect(paths.length).toBeLessThanOrEqual(5);
  expect(new Set(paths).size).toBe(paths.length);
});

// Product: a person sees the rail of the role to which the place belongs, the first of their roles that has it.
test.each([
  { roles: ["mentor"], path: "/recordings", as: null, role: "mentor", current: "Recordings" },
  { roles: ["assessor", "mentor"], path: "/today", as: null, role: "mentor", current: "Today" },
  { roles: ["assessor", "mentor"], path: "/today", as: "assessor", role: "assessor", current: "Today" },
  { roles: ["assessor", "mentor"], path: "/ready", as: null, role: "assessor", current: "Ready" },
  { roles: ["assessor", "mentor"], path: "/ready", as: "mentor", role: "assessor", current: "Ready" },
  { roles: ["assessor", "mentor"], path: "/observations/0192", as: null, role: "assessor", current: "Observations" },
  { roles: ["mentor"], path: "/today", as: "manager", role: "mentor", current: "Today" },
  { roles: ["liaison", "manager"], path: "/sign-offs/0192", as: "manager", role: "manager", current: "Sign-offs" },
  { roles: ["mentor"], path: "/modulesque", as: null, role: "mentor", current: undefined },
  { roles: ["assessor", "mentor"], path: "/legend", as: "assessor", role: "assessor", current: undefined },
] as const)("$roles at $path as $as: $role", ({ roles, path, as, role, current }) => {
  const rail = placesFor(new Set(roles), path, as);
  expect(rail.role).toBe(role);
  expect(rail.places.find((place) => place.current)?.label).toBe(current);
  expect(rail.places.filter((place) => place.current).length).toBeLessThanOrEqual(1);
});

test("a place that several of one's roles share carries the role; one's only role needs none", () => {
  expect(placesFor(["mentor", "assessor"], "/ready").places.map((place) => place.href)).toEqual([
    "/today?as=assessor",
    "/ready",
    "/observations",
    "/sign-offs",
  ]);
  expect(beginningOf(["mentor"], "mentor")).toBe("/today");
  expect(beginningOf(["mentor", "manager"], "manager")).toBe("/today?as=manager");
});

test("who has no role has no rail", () => {
  expect(placesFor([], "/today")).toEqual({ role: undefined, places: [] });
});
