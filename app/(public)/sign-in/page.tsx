import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { NarrowSheet, PublicFrame } from "@/components/accounts/public-frame";
import { SignInForm } from "@/components/accounts/sign-in-form";
import { findSignedIn } from "@/lib/auth/actor";
import { localPath } from "@/lib/core/local-path";
import { viewDemoSignIns } from "@/lib/services/accounts/view-demo-sign-ins";

export const metadata: Metadata = { title: "Sign in" };

type SearchParams = Promise<Record<string, string | string[] | undefined>>;

export default async function SignInPage({ searchParams }: { searchParams: SearchParams }) {
  const next = localPath((await searchParams).next) ?? "/";
  if (await findSignedIn()) redirect(next);
  const demonstration = await viewDemoSignIns();
  return (
    <PublicFrame>
      <NarrowSheet title="Sign in" next="With the address to which your invitation was sent.">
        <SignInForm next={next} {...(demonstration ? { demo: demonstration.signIns, mailSinkUrl: demonstration.mailSinkUrl } : {})} />
      </NarrowSheet>
    </PublicFrame>
  );
}
