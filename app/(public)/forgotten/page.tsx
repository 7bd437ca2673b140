import type { Metadata } from "next";
import { ForgottenForm } from "@/components/accounts/forgotten-form";
import { NarrowSheet, PublicFrame } from "@/components/accounts/public-frame";

export const metadata: Metadata = { title: "Set a new password" };

export default function ForgottenPage() {
  return (
    <PublicFrame>
      <NarrowSheet title="Set a new password" next="We send a link to your address. Your old password works until you use it.">
        <ForgottenForm />
      </NarrowSheet>
    </PublicFrame>
  );
}
