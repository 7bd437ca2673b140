import type { Metadata } from "next";
import { LegendDialog } from "@/components/bolt/legend-dialog";
import { PageHead } from "@/components/frame/page-head";
import { Page, Sheet } from "@/components/frame/sheet";
import { Plate } from "@/components/plate/plate";
import { plateColumns, plateLines } from "@/components/plate/plate-parts";
import { PrintButton } from "@/components/ui/print-button";
import { EmptyPlace } from "@/components/ui/notice";
import { formatDay } from "@/lib/core/dates";
import { requireActor, view } from "@/lib/http/page";
import { today } from "@/lib/services/clock";
import { viewWorkshopPlate } from "@/lib/services/workshop/view-workshop-plate";

export const metadata: Metadata = { title: "Work limits" };

export default async function LimitsPage({ params }: { params: Promise<{ org: string }> }) {
  const { org } = await params;
  const actor = await requireActor(org, "/limits");
  const plate = await view(viewWorkshopPlate(actor));
  const alone = plate.rows.reduce((sum, row) => sum + row.standings.filter(({ held }) => held.kind === "level" && held.level === 5).length, 0);
  return (
    <Page>
      <PageHead
        title="Work limits"
        next={`As of ${formatDay(today())}. ${alone} ${alone === 1 ? "task is" : "tasks are"} held at level 5, alone. Below 4 a mentor stands alongside.`}
        actions={
          <>
            <LegendDialog />
            <PrintButton />
          </>
        }
      />
      {plate.rows.length === 0 ? (
        <EmptyPlace title="Nobody trains here today">Work limits follow from sign-offs.</EmptyPlace>
      ) : (
        <Sheet>
          <Plate caption="Who may do what today" columns={plateColumns(plate.tasks)} lines={plateLines(plate.rows)} tailLabel="Waits to be seen" />
        </Sheet>
      )}
    </Page>
  );
}
