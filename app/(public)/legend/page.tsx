import type { Metadata } from "next";
import { PublicFrame } from "@/components/accounts/public-frame";
import { Bolt } from "@/components/bolt/bolt";
import { BoltLegend, LEGEND } from "@/components/bolt/bolt-legend";
import { Page, Sheet, SheetPart } from "@/components/frame/sheet";
import { PageHead } from "@/components/frame/page-head";

export const metadata: Metadata = { title: "What the bolts mean" };

/** The same drawing at the sizes where it is used: in a line, in a table, on a plate, beside a heading, on a sign-off. */
const SIZES = [16, 22, 34, 52, 104];

export default function LegendPage() {
  return (
    <PublicFrame>
      <Page narrow>
        <PageHead title="What the bolts mean" next="Line straight: holds. Line broken: look again. The number stamped on the head is the supervision level." />
        <Sheet>
          <SheetPart title="Every state">
            <BoltLegend />
          </SheetPart>
          <SheetPart title="From small to large">
            <ul className="grid gap-4">
              {SIZES.map((size) => (
                <li key={size} className="flex flex-wrap items-center gap-3">
                  <span className="w-16 text-sm text-ink2">{size} px</span>
                  {LEGEND.map(({ standing, words }) => (
                    <Bolt key={words} standing={standing} size={size} label="" />
                  ))}
                </li>
              ))}
            </ul>
          </SheetPart>
        </Sheet>
      </Page>
    </PublicFrame>
  );
}
