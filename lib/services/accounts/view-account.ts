import { getDb } from "@/db/client";
import { listOpenSessions } from "@/db/queries/sessions";
import { deviceName } from "@/lib/core/device-name";
import type { SignedIn } from "@/lib/core/roles";
import { listPosts, type Post } from "@/lib/services/frame/view-frame";

export type AccountView = {
  name: string;
  email: string;
  posts: Post[];
  sessions: { id: string; device: string; createdAt: Date; lastSeenAt: Date; here: boolean }[];
};

/** The person's own account: what they are where, and on which devices they are signed in, the newest first. */
export async function viewAccount(signedIn: SignedIn): Promise<AccountView> {
  const [posts, sessions] = await Promise.all([listPosts(signedIn.personId), listOpenSessions(getDb(), signedIn.personId)]);
  return {
    name: signedIn.name,
    email: signedIn.email,
    posts,
    sessions: sessions.map(({ device, ...session }) => ({
      ...session,
      device: deviceName(device),
      here: session.id === signedIn.sessionId,
    })),
  };
}
