import type { Knex } from "knex";
import { DEMO_PASSWORD, ORGANISATIONS } from "@/db/seeds/demo/cast";
import { orgId, personId } from "@/db/seeds/demo/ids";
import { loadDemo } from "@/db/seeds/demo/load-demo";
import { getDb } from "@/db/client";
import { hashPassword } from "@/lib/auth/passwords";
import { ROLES, type Actor, type Role } from "@/lib/core/roles";
import { today } from "@/lib/services/clock";
import { getStore } from "@/storage/store";
import { createMember, createOrganisation, type Organisation } from "./factories";

export type Caller = "anonymous" | Role | "outsider";
export const CALLERS: Caller[] = ["anonymous", ...ROLES, "outsider"];
export type Place = "vennick" | "merrowdale";

export type World = {
  owner: Knex;
  orgs: Record<Place, Organisation>;
  /** One person a role at each place; the outsider holds every role, elsewhere. */
  at: (place: Place, caller: Caller) => Actor | null;
  /** Gives the caller the password that the demo states, whatever it was changed to. */
  resetPassword: (actor: Actor | null) => Promise<void>;
};

export { DEMO_PASSWORD };

/** The demo's workshop and college with a member for each role; the apprentice and the college's assessor are the demo's own. */
export async function apiWorld(owner: Knex): Promise<World> {
  const passwordHash = await hashPassword(DEMO_PASSWORD);
  let files = 0;
  // The bench reads its strip of small pictures from the store; nothing else of the films is read here.
  const putFile = async (of: { subjectId: string; kind: string }, _path: string, contentType: string) => {
    const storeKey = `demo/${of.subjectId}/${of.kind}/${(files += 1)}`;
    if (of.kind === "storyboard_track") await getStore().putObject(storeKey, Buffer.from("WEBVTT\n"), { contentType });
    return { storeKey, sizeBytes: 1 };
  };
  await loadDemo(owner, { day: today(), passwordHash, putFile });
  const organisation = (place: Place): Organisation => ({ id: orgId(place), ...ORGANISATIONS[place], isDemo: true });
  const orgs = { vennick: organisation("vennick"), merrowdale: organisation("merrowdale") };
  const outsider = await createMember(await createOrganisation("workshop"), [...ROLES], { passwordHash });
  const people = new Map<string, Actor>();
  for (const place of ["vennick", "merrowdale"] as const) {
    for (const role of ROLES) people.set(`${place} ${role}`, await createMember(orgs[place], role, { passwordHash }));
    people.set(`${place} apprentice`, await castMember("asha", orgs[place], "apprentice"));
  }
  people.set("merrowdale assessor", await castMember("idris", orgs.merrowdale, "assessor"));
  return {
    owner,
    orgs,
    at: (place, caller) => (caller === "anonymous" ? null : caller === "outsider" ? outsider : (people.get(`${place} ${caller}`) ?? null)),
    resetPassword: async (actor) => {
      if (actor) await owner("people").where({ id: actor.personId }).update({ password_hash: passwordHash });
    },
  };
}

async function castMember(key: string, organisation: Organisation, role: Role): Promise<Actor> {
  const person = await getDb()("people").select("name", "email").where({ id: personId(key) }).first();
  return { personId: personId(key), name: person.name, email: person.email, sessionId: "", organisation, roles: new Set([role]) };
}
