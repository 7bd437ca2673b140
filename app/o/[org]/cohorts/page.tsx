import type { Metadata } from "next";
import Link from "next/link";
import { PageHead } from "@/components/frame/page-head";
import { Page, Sheet } from "@/components/frame/sheet";
import { EmptyPlace } from "@/components/ui/notice";
import { formatDay } from "@/lib/core/dates";
import { requireActor, view } from "@/lib/http/page";
import { viewCohorts } from "@/lib/services/cohorts/view-cohort";

export const metadata: Metadata = { title: "Cohorts" };

export default async function CohortsPage({ params }: { params: Promise<{ org: string }> }) {
  const { org } = await params;
  const actor = await requireActor(org, "/cohorts");
  const cohorts = await view(viewCohorts(actor));
  return (
    <Page narrow>
      <PageHead title="Cohorts" next="Each opens the plate of its apprentices and tasks." />
      {cohorts.length === 0 ? (
        <EmptyPlace title="No cohorts yet">A cohort gathers the training agreements of those who began together.</EmptyPlace>
      ) : (
        <Sheet>
          <ul>
            {cohorts.map((cohort) => (
              <li key={cohort.id} className="border-b border-rule last:border-b-0">
                <Link href={`/o/${org}/cohorts/${cohort.id}`} className="flex min-h-16 items-center justify-between gap-4 px-4 py-3 hover:bg-tint">
                  <span className="font-plate text-[1.35rem] font-semibold">{cohort.name}</span>
                  <span className="text-ink2">
                    {cohort.members} apprentices, since {formatDay(cohort.startsOn)}
                  </span>
                </Link>
              </li>
            ))}
          </ul>
        </Sheet>
      )}
    </Page>
  );
}
