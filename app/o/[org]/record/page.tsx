import type { Metadata } from "next";
import Link from "next/link";
import { StandingLine } from "@/components/bolt/standing-line";
import { PageHead } from "@/components/frame/page-head";
import { Page, Sheet, SheetPart } from "@/components/frame/sheet";
import { PrintButton } from "@/components/ui/print-button";
import { EmptyPlace } from "@/components/ui/notice";
import { Tag } from "@/components/ui/tag";
import { formatDay } from "@/lib/core/dates";
import { requireActor, view } from "@/lib/http/page";
import { viewRecord } from "@/lib/services/record/view-record";

export const metadata: Metadata = { title: "Record" };

export default async function RecordPage({ params }: { params: Promise<{ org: string }> }) {
  const { org } = await params;
  const actor = await requireActor(org, "/record");
  const { tasks, signOffs } = await view(viewRecord(actor));
  return (
    <Page narrow>
      <PageHead title="Record" next={`${actor.name}: what was seen, and what you hold today.`} actions={<PrintButton />} />
      {signOffs.length === 0 ? (
        <EmptyPlace title="Nothing is signed yet">Each signed sheet appears here, met or not yet, and stays.</EmptyPlace>
      ) : (
        <Sheet>
          <SheetPart title="Held">
            <ul className="grid gap-3 sm:grid-cols-2">
              {tasks.map((task) => (
                <li key={task.id}>
                  <span className="block font-semibold">{task.title}</span>
                  <StandingLine standing={task.standing} size={36} />
                </li>
              ))}
            </ul>
          </SheetPart>
          <SheetPart title="Signed sheets">
            <ul>
              {signOffs.map((signOff) => (
                <li key={signOff.signOffId} className="border-b border-rule last:border-b-0">
                  <Link href={`/o/${org}/sign-offs/${signOff.signOffId}`} className="flex min-h-12 flex-wrap items-center justify-between gap-x-4 py-2 hover:bg-tint">
                    <span>
                      <span className="font-semibold">{signOff.task}</span>
                      <span className="block text-ink2">
                        {formatDay(signOff.signedAt.toISOString().slice(0, 10))}, {signOff.assessor}
                      </span>
                    </span>
                    <Tag kind={signOff.outcome === "met" && !signOff.withdrawn ? "strong" : "plain"}>
                      {signOff.withdrawn ? "withdrawn" : signOff.outcome === "met" ? `met, level ${signOff.level}` : "not yet"}
                    </Tag>
                  </Link>
                </li>
              ))}
            </ul>
          </SheetPart>
        </Sheet>
      )}
    </Page>
  );
}
