import type { Metadata } from "next";
import Link from "next/link";
import { PageHead } from "@/components/frame/page-head";
import { Page, Sheet } from "@/components/frame/sheet";
import { DataTable, type Row } from "@/components/ui/data-table";
import { EmptyPlace } from "@/components/ui/notice";
import { Tag } from "@/components/ui/tag";
import { formatDay } from "@/lib/core/dates";
import { requireActor, view } from "@/lib/http/page";
import { viewSignOffs, type SignOffListItem } from "@/lib/services/sign-offs/view-sign-offs";

export const metadata: Metadata = { title: "Sign-offs" };

const COLUMNS = [
  { key: "signedAt", label: "Signed" },
  { key: "apprentice", label: "Apprentice" },
  { key: "task", label: "Task" },
  { key: "outcome", label: "Outcome" },
  { key: "assessor", label: "Assessor" },
  { key: "workshop", label: "Workshop" },
];

export default async function SignOffsPage({ params }: { params: Promise<{ org: string }> }) {
  const { org } = await params;
  const actor = await requireActor(org, "/sign-offs");
  const items = await view(viewSignOffs(actor));
  return (
    <Page>
      <PageHead title="Sign-offs" next="Each opens the sheet that it rests on and its entry in the ledger." />
      {items.length === 0 ? (
        <EmptyPlace title="Nothing is signed yet">A signed observation sheet appears here, met or not yet.</EmptyPlace>
      ) : (
        <Sheet>
          <DataTable caption="Sign-offs" columns={COLUMNS} rows={items.map((item) => rowOf(org, item))} sortedBy={{ key: "signedAt", descending: true }} />
        </Sheet>
      )}
    </Page>
  );
}

function rowOf(org: string, item: SignOffListItem): Row {
  const words = item.withdrawn ? "withdrawn" : item.outcome === "met" ? `met, level ${item.level}` : "not yet";
  return {
    id: item.signOffId,
    cells: {
      signedAt: {
        show: (
          <Link className="underline underline-offset-4" href={`/o/${org}/sign-offs/${item.signOffId}`}>
            {formatDay(item.signedAt.toISOString().slice(0, 10))}
          </Link>
        ),
        sort: item.signedAt.getTime(),
      },
      apprentice: { show: item.apprentice, sort: item.apprentice },
      task: { show: item.task, sort: item.task },
      outcome: { show: <Tag kind={item.outcome === "met" && !item.withdrawn ? "strong" : "plain"}>{words}</Tag>, sort: words },
      assessor: { show: item.assessor, sort: item.assessor },
      workshop: { show: item.workshop, sort: item.workshop },
    },
  };
}
