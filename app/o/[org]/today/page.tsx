import type { Metadata } from "next";
import Link from "next/link";
import { PageHead } from "@/components/frame/page-head";
import { Page, Sheet } from "@/components/frame/sheet";
import { LinkButton } from "@/components/ui/button";
import { EmptyPlace } from "@/components/ui/notice";
import { formatDay } from "@/lib/core/dates";
import { requireActor, view } from "@/lib/http/page";
import { today } from "@/lib/services/clock";
import { viewToday } from "@/lib/services/today/view-today";

export const metadata: Metadata = { title: "Today" };

export default async function TodayPage({ params }: { params: Promise<{ org: string }> }) {
  const { org } = await params;
  const actor = await requireActor(org, "/today");
  const [first, ...rest] = await view(viewToday(actor));
  return (
    <Page narrow>
      <p className="text-ink2">{formatDay(today())}</p>
      {!first ? (
        <>
          <PageHead title="Nothing waits for you" />
          <EmptyPlace title="All done for now">What needs you appears here, with its reason.</EmptyPlace>
        </>
      ) : (
        <>
          <PageHead title={first.title} next={first.reason} />
          <LinkButton kind="main" href={`/o/${org}${first.href}`} className="mb-6 min-h-14 w-full sm:w-auto sm:px-10">
            Go there
          </LinkButton>
          {rest.length > 0 && (
            <Sheet>
              <h2 className="border-b-2 border-steel px-4 py-3 text-[1.4rem] leading-tight">Then</h2>
              <ul>
                {rest.map((item) => (
                  <li key={`${item.href} ${item.title}`} className="border-b border-rule last:border-b-0">
                    <Link href={`/o/${org}${item.href}`} className="grid min-h-14 gap-0.5 px-4 py-3 hover:bg-tint">
                      <span className="text-[1.05rem] font-semibold">{item.title}</span>
                      <span className="text-ink2">{item.reason}</span>
                    </Link>
                  </li>
                ))}
              </ul>
            </Sheet>
          )}
        </>
      )}
    </Page>
  );
}
