import type { ReactNode } from "react";
import { MemberRail } from "@/components/accounts/member-rail";
import { QueryProvider } from "@/components/api/query-provider";
import { UploadStrip } from "@/components/upload/upload-strip";
import { findActor, findSignedIn } from "@/lib/auth/actor";
import { viewFrame } from "@/lib/services/frame/view-frame";

/** The rail around an organisation's pages. It guards nothing: each page asks for its own actor, since a layout doesn't run again. */
export default async function OrganisationLayout({ children, params }: { children: ReactNode; params: Promise<{ org: string }> }) {
  const { org } = await params;
  const signedIn = await findSignedIn();
  const actor = signedIn && (await findActor(signedIn, org));
  if (!actor) return children;
  return (
    <QueryProvider>
      <MemberRail frame={await viewFrame(actor)} />
      {actor.roles.has("mentor") && <UploadStrip org={org} />}
      {children}
    </QueryProvider>
  );
}
