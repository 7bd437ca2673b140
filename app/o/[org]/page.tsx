import { redirect } from "next/navigation";
import { requireActor } from "@/lib/http/page";

/** An organisation's front door leads to today's work. */
export default async function OrganisationPage({ params }: { params: Promise<{ org: string }> }) {
  const { org } = await params;
  const actor = await requireActor(org, "");
  redirect(`/o/${actor.organisation.slug}/today`);
}
