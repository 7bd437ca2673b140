import type { Metadata } from "next";
import { JoinForm } from "@/components/accounts/join-form";
import { NarrowSheet, PublicFrame } from "@/components/accounts/public-frame";

export const metadata: Metadata = { title: "Join", robots: { index: false } };

/** Where an invitation's link leads. The token stands behind the "#", so the server meets it only in the body of a request. */
export default function JoinPage() {
  return (
    <PublicFrame>
      <NarrowSheet title="Your invitation">
        <JoinForm />
      </NarrowSheet>
    </PublicFrame>
  );
}
