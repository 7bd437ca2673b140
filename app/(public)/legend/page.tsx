import type { Metadata } from "next";
import { PublicFrame } from "@/components/accounts/public-frame";
import { Bolt } from "@/components/bolt/bolt";
import { BoltLegend, LEGEND } from "@/components/bolt/bolt-legend";
import { Page, Sheet, SheetPart } from "@/components/frame/sheet";
import { PageHead } from "@/components/frame/page-head";

export const metadata: Metadata = { title: "What the bolts mean" };

export default function LegendPage() {
  return (
    <PublicFrame>
      <Page narrow>
        <PageHead title="What the bolts mean" next="Line straight: holds. Line broken: look again. The number stamped on the head is the supervision level." />
        <Sheet>
          <SheetPart title="Every state">
            <BoltLegend />
          </SheetPart>
          <SheetPart title="Small and large">
            <div className="flex flex-wrap items-end gap-5">
              {[16, 24, 34, 64, 120].map((size) => (
                <Bolt key={size} standing={LEGEND[6]?.standing ?? { held: { kind: "nothing" }, next: "open" }} size={size} label="" />
              ))}
            </div>
          </SheetPart>
        </Sheet>
      </Page>
    </PublicFrame>
  );
}
