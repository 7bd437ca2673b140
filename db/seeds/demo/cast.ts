import type { OrganisationKind, Role } from "@/lib/core/roles";

/** Everybody and everything here is invented. Ages and dates are relative to the day on which the demo is loaded. */
export const ORGANISATIONS = {
  vennick: { slug: "vennick", name: "Vennick & Daughter Garage", kind: "workshop" },
  saltmarsh: { slug: "saltmarsh", name: "Saltmarsh Row Autocare", kind: "workshop" },
  merrowdale: { slug: "merrowdale", name: "Merrowdale College of Motor Trades", kind: "college" },
} as const satisfies Record<string, { slug: string; name: string; kind: OrganisationKind }>;

export type OrganisationKey = keyof typeof ORGANISATIONS;

export type CastMember = {
  key: string;
  name: string;
  email: string;
  /** Born this many years and days before the demo's day. */
  ageYears: number;
  ageDays: number;
  at: Partial<Record<OrganisationKey, Role[]>>;
};

const member = (name: string, at: CastMember["at"], ageYears = 38, ageDays = 120): CastMember => {
  const key = name.split(" ")[0]?.toLowerCase() ?? name;
  return { key, name, email: `${key}@demo.invalid`, ageYears, ageDays, at };
};
const apprentice = (name: string, workshop: OrganisationKey, ageYears: number): CastMember =>
  member(name, { [workshop]: ["apprentice"], merrowdale: ["apprentice"] }, ageYears, 150);

export const STAFF: CastMember[] = [
  member("Marguerite Vennick", { vennick: ["manager", "mentor"] }, 56),
  member("Sunniva Pryce", { vennick: ["mentor"] }),
  member("Bertram Okolund", { vennick: ["mentor", "assessor"] }, 49),
  member("Harriet Quillfeather", { saltmarsh: ["manager", "mentor"] }, 44),
  member("Idris Harkwell", { merrowdale: ["assessor"] }, 51),
  member("Petra Lindqvale", { merrowdale: ["assessor"] }, 33),
  member("Deepa Thornquist", { merrowdale: ["liaison", "manager"] }, 41),
  member("Calum Ravensby", { merrowdale: ["verifier"] }, 47),
];

export const APPRENTICES: CastMember[] = [
  apprentice("Asha Dunmore", "vennick", 17),
  apprentice("Tomasz Wrenfield", "vennick", 19),
  apprentice("Niamh Calloway", "vennick", 22),
  apprentice("Joss Amberley", "vennick", 18),
  apprentice("Orla Fenwick", "saltmarsh", 18),
  apprentice("Milo Tarrant", "saltmarsh", 20),
  apprentice("Lowri Penhallow", "saltmarsh", 19),
  apprentice("Ewan Castlebridge", "saltmarsh", 23),
];

/** Days before the demo's day on which each agreement began, and after it on which it is planned to end. */
export const AGREEMENTS: { apprentice: string; workshop: OrganisationKey; startsDaysAgo: number; endedDaysAgo: number | null; plannedEndInDays: number }[] = [
  { apprentice: "asha", workshop: "vennick", startsDaysAgo: 224, endedDaysAgo: null, plannedEndInDays: 871 },
  { apprentice: "tomasz", workshop: "vennick", startsDaysAgo: 616, endedDaysAgo: null, plannedEndInDays: 479 },
  { apprentice: "niamh", workshop: "vennick", startsDaysAgo: 1106, endedDaysAgo: null, plannedEndInDays: 29 },
  { apprentice: "joss", workshop: "saltmarsh", startsDaysAgo: 430, endedDaysAgo: 61, plannedEndInDays: 600 },
  { apprentice: "joss", workshop: "vennick", startsDaysAgo: 60, endedDaysAgo: null, plannedEndInDays: 600 },
  { apprentice: "orla", workshop: "saltmarsh", startsDaysAgo: 380, endedDaysAgo: null, plannedEndInDays: 700 },
  { apprentice: "milo", workshop: "saltmarsh", startsDaysAgo: 700, endedDaysAgo: null, plannedEndInDays: 395 },
  { apprentice: "lowri", workshop: "saltmarsh", startsDaysAgo: 300, endedDaysAgo: null, plannedEndInDays: 795 },
  { apprentice: "ewan", workshop: "saltmarsh", startsDaysAgo: 1000, endedDaysAgo: null, plannedEndInDays: 95 },
];

export const VEHICLES: Record<"vennick" | "saltmarsh", { label: string; model: string }[]> = {
  vennick: [
    { label: "DEMO 001", model: "Corvane Lume 1.2" },
    { label: "DEMO 002", model: "Tessaly Brisk 1.0" },
    { label: "DEMO 003", model: "Haldor Rove van" },
  ],
  saltmarsh: [
    { label: "DEMO 004", model: "Tessaly Brisk 1.0" },
    { label: "DEMO 005", model: "Corvane Lume 1.2" },
  ],
};

/** Torque wrench TW-3 is past its date, so that a sheet can show what that means. */
export const INSTRUMENTS = [
  { label: "TW-1", kind: "torque wrench", unit: "N·m", low: 5, high: 50, calibratedDaysAgo: 90, dueInDays: 275 },
  { label: "TW-2", kind: "torque wrench", unit: "N·m", low: 20, high: 200, calibratedDaysAgo: 150, dueInDays: 215 },
  { label: "TW-3", kind: "torque wrench", unit: "N·m", low: 20, high: 200, calibratedDaysAgo: 370, dueInDays: -5 },
  { label: "MIC-4", kind: "micrometer", unit: "mm", low: 0, high: 25, calibratedDaysAgo: 200, dueInDays: 165 },
  { label: "DG-2", kind: "dial gauge", unit: "mm", low: 0, high: 10, calibratedDaysAgo: 200, dueInDays: 165 },
  { label: "MM-1", kind: "multimeter", unit: "V", low: 0, high: 600, calibratedDaysAgo: 60, dueInDays: 305 },
  { label: "PT-1", kind: "pressure tester", unit: "bar", low: 0, high: 4, calibratedDaysAgo: 60, dueInDays: 305 },
];

export const LICENCES = [
  { person: "bertram", kind: "refrigerant handling", number: "DEMO-GAS-0417", fromDaysAgo: 1810, untilInDays: 16 },
];

/** Stated on the sign-in page of a demo installation; never used for anything else. */
export const DEMO_PASSWORD = "witness-line-demo-2026";
