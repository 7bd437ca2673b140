import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { z } from "zod";
import { Page } from "@/components/frame/sheet";
import { RecordingSheet } from "@/components/recordings/recording-sheet";
import { DemoBanner } from "@/components/ui/caution";
import { addressId, requireActor, view } from "@/lib/http/page";
import { viewRecording } from "@/lib/services/recordings/view-recording";
import { viewRecordingMedia } from "@/lib/services/recordings/view-recording-media";
import { viewVehicles } from "@/lib/services/recordings/view-vehicles";

export const metadata: Metadata = { title: "Recording" };

export default async function RecordingPage({ params }: { params: Promise<{ org: string; recordingId: string }> }) {
  const { org, recordingId } = await params;
  addressId(recordingId);
  const actor = await requireActor(org, `/recordings/${recordingId}`);
  if (!z.uuid().safeParse(recordingId).success) notFound();
  const recording = await view(viewRecording(actor, recordingId));
  const media = await view(viewRecordingMedia(actor, recordingId));
  const vehicles = await view(viewVehicles(actor));
  return (
    <>
      {actor.organisation.isDemo && <DemoBanner />}
      <Page>
        <RecordingSheet org={org} first={recording} firstMedia={media} vehicles={vehicles} />
      </Page>
    </>
  );
}
