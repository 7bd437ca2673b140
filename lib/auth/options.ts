import "server-only";
import type { NextAuthOptions } from "next-auth";
import Credentials from "next-auth/providers/credentials";
import { getDb } from "@/db/client";
import { findPersonByEmail } from "@/db/queries/people";
import { countHit } from "@/db/queries/rate-limits";
import { endSession, startSession } from "@/db/queries/sessions";
import { verifyPassword } from "@/lib/auth/passwords";

const SESSION_DAYS = 14;
/** Guesses a quarter of an hour for one address. The limit is the same whether the address exists or not. */
const GUESSES = { limit: 10, windowSeconds: 15 * 60 };

declare module "next-auth" {
  interface Session {
    sessionId?: string;
  }
  interface User {
    sessionId?: string;
  }
}
declare module "next-auth/jwt" {
  interface JWT {
    sessionId?: string;
  }
}

/** Sign-in by address and password. The token in the cookie carries a session's id and nothing that decides anything. */
export const authOptions: NextAuthOptions = {
  session: { strategy: "jwt", maxAge: SESSION_DAYS * 24 * 3600 },
  // Every page is ours: the library's own bring styles that the content policy refuses.
  pages: { signIn: "/sign-in", error: "/sign-in", signOut: "/account", verifyRequest: "/sign-in" },
  providers: [
    Credentials({
      name: "password",
      credentials: { email: {}, password: {} },
      async authorize(credentials, request) {
        const email = String(credentials?.email ?? "").trim().toLowerCase();
        const password = String(credentials?.password ?? "");
        const db = getDb();
        if (!(await countHit(db, `sign-in:${email.slice(0, 254)}`, GUESSES))) throw new Error("too_many");
        const person = await findPersonByEmail(db, email);
        // The password is checked even where there is nobody to check it for, so that the time taken says nothing.
        const right = await verifyPassword(person?.passwordHash ?? null, password);
        if (!person || !right || person.suspendedAt) return null;
        const device = String(request.headers?.["user-agent"] ?? "").slice(0, 200);
        const sessionId = await startSession(db, { personId: person.id, device, days: SESSION_DAYS });
        return { id: person.id, sessionId };
      },
    }),
  ],
  callbacks: {
    jwt({ token, user }) {
      return user?.sessionId ? { sub: user.id, sessionId: user.sessionId } : token;
    },
    session({ session, token }) {
      return { expires: session.expires, ...(token.sessionId ? { sessionId: token.sessionId } : {}) };
    },
  },
  events: {
    async signOut({ token }) {
      if (token?.sessionId) await endSession(getDb(), token.sessionId);
    },
  },
};
