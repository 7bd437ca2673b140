import type { Metadata } from "next";
import { ObservationSheet } from "@/components/observations/observation-sheet";
import { DemoBanner } from "@/components/ui/caution";
import { addressId, requireActor, view } from "@/lib/http/page";
import { today } from "@/lib/services/clock";
import { viewSheet } from "@/lib/services/observations/view-sheet";

export const metadata: Metadata = { title: "Observation sheet" };

export default async function ObservationPage({ params }: { params: Promise<{ org: string; observationId: string }> }) {
  const { org, observationId } = await params;
  addressId(observationId);
  const actor = await requireActor(org, `/observations/${observationId}`);
  const sheet = await view(viewSheet(actor, observationId));
  return (
    <>
      {actor.organisation.isDemo && <DemoBanner />}
      <ObservationSheet params={{ org, observationId }} {...sheet} today={today()} />
    </>
  );
}
