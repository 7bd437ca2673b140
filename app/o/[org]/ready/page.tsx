import type { Metadata } from "next";
import { PageHead } from "@/components/frame/page-head";
import { Page, Sheet } from "@/components/frame/sheet";
import { ReadyRow } from "@/components/observations/ready-row";
import { EmptyPlace } from "@/components/ui/notice";
import { requireActor, view } from "@/lib/http/page";
import { viewReady } from "@/lib/services/observations/view-ready";

export const metadata: Metadata = { title: "Ready" };

export default async function ReadyPage({ params }: { params: Promise<{ org: string }> }) {
  const { org } = await params;
  const actor = await requireActor(org, "/ready");
  const items = await view(viewReady(actor));
  const longest = items[0];
  return (
    <Page narrow>
      <PageHead
        title="Ready to be observed"
        next={longest ? `${longest.apprentice} has waited longest, ${longest.waitedDays} days. Make a date, or open the sheet at the vehicle.` : "Nobody waits."}
      />
      {items.length === 0 ? (
        <EmptyPlace title="Nobody waits to be observed">An apprentice who says “ready” appears here, with the days waited.</EmptyPlace>
      ) : (
        <Sheet>
          <ul>
            {items.map((item) => (
              <ReadyRow key={item.readinessId} org={org} item={item} />
            ))}
          </ul>
        </Sheet>
      )}
    </Page>
  );
}
