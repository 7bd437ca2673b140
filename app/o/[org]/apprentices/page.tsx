import type { Metadata } from "next";
import { ConfirmRun } from "@/components/apprentices/confirm-run";
import { LegendDialog } from "@/components/bolt/legend-dialog";
import { PageHead } from "@/components/frame/page-head";
import { Page, Sheet, SheetPart } from "@/components/frame/sheet";
import { Plate } from "@/components/plate/plate";
import { plateColumns, plateLines } from "@/components/plate/plate-parts";
import { EmptyPlace } from "@/components/ui/notice";
import { formatDay } from "@/lib/core/dates";
import { requireActor, view } from "@/lib/http/page";
import { viewApprentices, type ApprenticesView } from "@/lib/services/workshop/view-apprentices";

export const metadata: Metadata = { title: "Apprentices" };

export default async function ApprenticesPage({ params }: { params: Promise<{ org: string }> }) {
  const { org } = await params;
  const actor = await requireActor(org, "/apprentices");
  const { plate, runs } = await view(viewApprentices(actor));
  return (
    <Page>
      <PageHead
        title="Apprentices"
        next={runs.length === 0 ? "No practice run waits for a witness." : `${runs.length} practice ${runs.length === 1 ? "run waits" : "runs wait"} for a witness.`}
        actions={<LegendDialog />}
      />
      {plate.rows.length === 0 ? (
        <EmptyPlace title="Nobody trains here today">Apprentices come with a training agreement between this workshop and a college.</EmptyPlace>
      ) : (
        <div className="grid grid-cols-[minmax(0,1fr)] gap-5">
          {runs.length > 0 && <Runs org={org} runs={runs} />}
          <Sheet>
            <Plate caption="Apprentices and tasks" columns={plateColumns(plate.tasks)} lines={plateLines(plate.rows)} tailLabel="Waits to be seen" />
          </Sheet>
        </div>
      )}
    </Page>
  );
}

function Runs({ org, runs }: { org: string; runs: ApprenticesView["runs"] }) {
  return (
    <Sheet>
      <SheetPart title="Practice runs to confirm">
        <ul>
          {runs.map((run) => (
            <li key={run.id} className="flex flex-wrap items-center justify-between gap-3 border-b border-rule py-2.5 last:border-b-0">
              <span className="min-w-0 flex-1 basis-60">
                <span className="font-semibold">{run.apprentice}</span>, {run.task}
                <span className="block text-ink2">
                  {formatDay(run.doneOn)} · {run.vehicle} · {run.minutes} min{run.note && ` · ${run.note}`}
                </span>
              </span>
              <ConfirmRun params={{ org, practiceRunId: run.id }} label={`I saw ${run.apprentice} on “${run.task}” on ${formatDay(run.doneOn)}`} />
            </li>
          ))}
        </ul>
      </SheetPart>
    </Sheet>
  );
}
