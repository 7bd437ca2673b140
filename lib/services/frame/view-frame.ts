import { getDb } from "@/db/client";
import { listActorRows } from "@/db/queries/people";
import { beginningOf } from "@/lib/core/places";
import { ROLES, roleLabel, type Actor, type Role } from "@/lib/core/roles";

/** What a person is at one place of work, and where to go to work as that. */
export type Post = { key: string; role: Role; roleLabel: string; organisation: string; href: string };

export type Frame = {
  name: string;
  organisation: { slug: string; name: string; isDemo: boolean };
  roles: { role: Role; label: string }[];
  /** Everything the person is, everywhere: the choices of the switch. Links only; they give no right. */
  posts: Post[];
};

/** What stands around every page of an organisation: the person, their roles here, and where else they work. */
export async function viewFrame(actor: Actor): Promise<Frame> {
  const { slug, name, kind, isDemo } = actor.organisation;
  return {
    name: actor.name,
    organisation: { slug, name, isDemo },
    roles: ROLES.filter((role) => actor.roles.has(role)).map((role) => ({ role, label: roleLabel(role, kind) })),
    posts: await listPosts(actor.personId),
  };
}

/** Each of the person's roles at each organisation that they belong to now, by organisation. */
export async function listPosts(personId: string): Promise<Post[]> {
  const memberships = await listActorRows(getDb(), personId);
  return memberships.flatMap(({ organisation, roles }) =>
    ROLES.filter((role) => roles.has(role)).map((role) => ({
      key: `${organisation.slug} ${role}`,
      role,
      roleLabel: roleLabel(role, organisation.kind),
      organisation: organisation.name,
      href: `/o/${organisation.slug}${beginningOf(roles, role)}`,
    })),
  );
}
