import type { Metadata } from "next";
import Link from "next/link";
import { Bench } from "@/components/bench/bench";
import { DemoBanner } from "@/components/ui/caution";
import { requireActor, view } from "@/lib/http/page";
import { viewBench } from "@/lib/services/marking/view-marking";

export const metadata: Metadata = { title: "Bench" };

export default async function BenchPage({ params }: { params: Promise<{ org: string; recordingId: string }> }) {
  const { org, recordingId } = await params;
  const actor = await requireActor(org, `/recordings/${recordingId}/bench`);
  const recording = await view(viewBench(actor, recordingId));
  return (
    <>
      {actor.organisation.isDemo && <DemoBanner />}
      <main id="main" tabIndex={-1} className="outline-none">
        <div className="flex flex-wrap items-baseline justify-between gap-x-6 gap-y-1 px-4 py-2.5">
          <h1 className="text-[1.5rem] leading-tight">{recording.title}</h1>
          <Link href={`/o/${org}/recordings/${recordingId}`} className="inline-flex min-h-11 items-center underline underline-offset-4">
            Back to the recording
          </Link>
        </div>
        <Bench
          params={{ org, recordingId }}
          durationMs={recording.durationMs}
          version={recording.version}
          first={{ steps: recording.steps, questions: recording.questions }}
          source={recording.media.p480 ?? recording.media.p720}
          poster={recording.media.poster}
          captions={recording.captions}
          storyboard={recording.storyboard}
        />
      </main>
    </>
  );
}
