import type { Metadata } from "next";
import Link from "next/link";
import { PageHead } from "@/components/frame/page-head";
import { Page, Sheet } from "@/components/frame/sheet";
import { LinkButton } from "@/components/ui/button";
import { EmptyPlace } from "@/components/ui/notice";
import { Tag } from "@/components/ui/tag";
import { formatDay } from "@/lib/core/dates";
import { requireActor, view } from "@/lib/http/page";
import { viewOpenSheets } from "@/lib/services/observations/view-open-sheets";

export const metadata: Metadata = { title: "Observations" };

export default async function ObservationsPage({ params }: { params: Promise<{ org: string }> }) {
  const { org } = await params;
  const actor = await requireActor(org, "/observations");
  const sheets = await view(viewOpenSheets(actor));
  return (
    <Page narrow>
      <PageHead title="Observations" next={sheets.length === 0 ? "No sheet of yours is open." : "Go on where you were, or sign what is finished."} />
      {sheets.length === 0 ? (
        <EmptyPlace title="No open sheet" action={<LinkButton kind="main" href={`/o/${org}/ready`}>Who is ready</LinkButton>}>
          A sheet is opened at the vehicle, from the list of those who are ready.
        </EmptyPlace>
      ) : (
        <Sheet>
          <ul>
            {sheets.map((sheet) => (
              <li key={sheet.observationId} className="border-b border-rule last:border-b-0">
                <Link href={`/o/${org}/observations/${sheet.observationId}`} className="flex min-h-16 flex-wrap items-center justify-between gap-x-4 px-4 py-3 hover:bg-tint">
                  <span>
                    <span className="block font-plate text-[1.3rem] font-semibold leading-tight">{sheet.task}</span>
                    <span className="text-ink2">
                      {sheet.apprentice} · {sheet.vehicle} · {formatDay(sheet.startedAt.toISOString().slice(0, 10))}
                    </span>
                  </span>
                  <Tag>
                    {sheet.filled} of {sheet.criteria} filled
                  </Tag>
                </Link>
              </li>
            ))}
          </ul>
        </Sheet>
      )}
    </Page>
  );
}
