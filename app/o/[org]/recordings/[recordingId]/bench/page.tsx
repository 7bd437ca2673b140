import type { Metadata } from "next";
import Link from "next/link";
import { notFound } from "next/navigation";
import { z } from "zod";
import { Bench } from "@/components/bench/bench";
import { Page } from "@/components/frame/sheet";
import { DemoBanner } from "@/components/ui/caution";
import { EmptyPlace } from "@/components/ui/notice";
import { addressId, requireActor, view } from "@/lib/http/page";
import { viewBench } from "@/lib/services/marking/view-bench";

export const metadata: Metadata = { title: "Marking out" };

export default async function BenchPage({ params }: { params: Promise<{ org: string; recordingId: string }> }) {
  const { org, recordingId } = await params;
  addressId(recordingId);
  const actor = await requireActor(org, `/recordings/${recordingId}/bench`);
  if (!z.uuid().safeParse(recordingId).success) notFound();
  const { title, film } = await view(viewBench(actor, recordingId));
  const back = `/o/${org}/recordings/${recordingId}`;
  return (
    <>
      {actor.organisation.isDemo && <DemoBanner />}
      {film ? (
        <Bench params={{ org, recordingId }} title={title} back={back} film={film} />
      ) : (
        <Page>
          <h1 className="mb-4 text-[1.9rem] leading-[1.05]">{title}</h1>
          <EmptyPlace
            title="The film is still being measured"
            action={
              <Link href={back} className="inline-flex min-h-11 items-center underline underline-offset-4">
                See how far it is
              </Link>
            }
          >
            Steps and questions lie on the film’s own time. They can be set as soon as it plays.
          </EmptyPlace>
        </Page>
      )}
    </>
  );
}
