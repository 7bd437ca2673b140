import { listPosts } from "@/lib/services/frame/view-frame";

/** Where a person begins after signing in: their only organisation's today, the choice where they have several, undefined where they have none. */
export async function findWayIn(personId: string): Promise<string | undefined> {
  const posts = await listPosts(personId);
  const organisations = new Set(posts.map((post) => post.organisation));
  if (posts.length === 0) return undefined;
  return organisations.size === 1 ? posts[0]?.href.replace(/\?.*$/, "") : "/o";
}
