import { z } from "zod";
import { ROLES } from "@/lib/core/roles";

/** An e-mail address in the one form in which it is stored and compared. */
export const emailSchema = z.string().trim().toLowerCase().max(254).pipe(z.email("That is not an e-mail address."));

/** A single-use link's token. Anything else can't be one and is treated like one that is not there. */
export const tokenSchema = z.string().max(200);

/** How long and how common it may be is judged by the password rules; here only that it is text of a sane size. */
export const passwordSchema = z.string().min(1, "Type a password.").max(1000, "That is longer than a password can be here.");

export const personNameSchema = z.string().trim().min(1, "Give the name.").max(120);

export const acceptInvitationSchema = z.object({
  token: tokenSchema,
  /** Only from somebody who is new here; who has an account signs in first. */
  person: z
    .object({ name: personNameSchema, password: passwordSchema, dateOfBirth: z.iso.date("Give the day as year, month and day.").nullable() })
    .optional(),
});
export type AcceptInvitationInput = z.infer<typeof acceptInvitationSchema>;

/** An invitation as its holder sees it. `you`: what has to happen before it can be accepted. */
export const invitationViewSchema = z.object({
  organisation: z.string(),
  name: z.string(),
  email: z.string(),
  roles: z.array(z.enum(ROLES)),
  roleLabels: z.array(z.string()),
  invitedBy: z.string().nullable(),
  expiresAt: z.iso.datetime(),
  you: z.enum(["new", "sign_in", "ready", "someone_else"]),
  signedInAs: z.string().nullable(),
});
export type InvitationView = z.infer<typeof invitationViewSchema>;

export const setPasswordSchema = z.object({ token: tokenSchema, password: passwordSchema });
export type SetPasswordInput = z.infer<typeof setPasswordSchema>;

export const changePasswordSchema = z.object({ current: passwordSchema, next: passwordSchema });
export type ChangePasswordInput = z.infer<typeof changePasswordSchema>;

/** One demonstration sign-in, as the demo's loading writes it. */
export const demoSignInSchema = z.object({
  role: z.enum(ROLES),
  name: z.string(),
  organisation: z.string(),
  email: z.string(),
  password: z.string(),
});
export type DemoSignIn = z.infer<typeof demoSignInSchema>;
