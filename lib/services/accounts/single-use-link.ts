import { createHash, randomBytes } from "node:crypto";
import { env } from "@/lib/env";

/** 256 random bits: nobody guesses it. Only its hash is stored, so that who reads the database can't use it. */
export function newToken(): { token: string; tokenHash: string } {
  const token = randomBytes(32).toString("base64url");
  return { token, tokenHash: hashToken(token) };
}

/** What is stored of a token: SHA-256 of its text, in hex. */
export function hashToken(token: string): string {
  return createHash("sha256").update(token).digest("hex");
}

/** The token stands behind the "#", which a browser never sends: it stays out of every server's log and of the Referer header. */
export function linkTo(page: "/join" | "/new-password", token: string): string {
  return `${env().APP_URL.replace(/\/$/, "")}${page}#${token}`;
}
