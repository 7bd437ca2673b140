import type { Metadata } from "next";
import { NewPasswordForm } from "@/components/accounts/new-password-form";
import { NarrowSheet, PublicFrame } from "@/components/accounts/public-frame";

export const metadata: Metadata = { title: "Set a new password", robots: { index: false } };

/** Where the link of a password letter leads. */
export default function NewPasswordPage() {
  return (
    <PublicFrame>
      <NarrowSheet title="Set a new password" next="You will be signed out on every device and sign in anew.">
        <NewPasswordForm />
      </NarrowSheet>
    </PublicFrame>
  );
}
