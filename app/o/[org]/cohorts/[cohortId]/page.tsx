import type { Metadata } from "next";
import Link from "next/link";
import { LegendDialog } from "@/components/bolt/legend-dialog";
import { PageHead } from "@/components/frame/page-head";
import { Page, Sheet } from "@/components/frame/sheet";
import { Plate } from "@/components/plate/plate";
import { plateColumns, plateLines } from "@/components/plate/plate-parts";
import { PrintButton } from "@/components/ui/print-button";
import { LinkButton } from "@/components/ui/button";
import { DataTable } from "@/components/ui/data-table";
import { EmptyPlace } from "@/components/ui/notice";
import { addressId, requireActor, view } from "@/lib/http/page";
import { viewCohort, type CohortView } from "@/lib/services/cohorts/view-cohort";

export const metadata: Metadata = { title: "Cohort" };

type CohortPageProps = { params: Promise<{ org: string; cohortId: string }>; searchParams: Promise<{ as?: string; show?: string }> };

export default async function CohortPage({ params, searchParams }: CohortPageProps) {
  const { org, cohortId } = await params;
  addressId(cohortId);
  const actor = await requireActor(org, `/cohorts/${cohortId}`);
  const { name, plate } = await view(viewCohort(actor, cohortId));
  const asTable = (await searchParams).show === "table";
  return (
    <Page>
      <PageHead
        title={name}
        next={nextLine(plate)}
        actions={
          <>
            <LegendDialog />
            <PrintButton />
            <LinkButton kind="main" download href={`/api/v1/orgs/${org}/cohorts/${cohortId}/progress.csv`}>
              Download CSV
            </LinkButton>
          </>
        }
      />
      <nav aria-label="How it is shown" className="mb-3 flex gap-5" data-no-print>
        <ShowLink href="?show=plate" on={!asTable}>
          Plate
        </ShowLink>
        <ShowLink href="?show=table" on={asTable}>
          Table
        </ShowLink>
      </nav>
      {plate.rows.length === 0 ? (
        <EmptyPlace title="Nobody is in this cohort yet">Apprentices come in with their training agreement.</EmptyPlace>
      ) : (
        <Sheet>
          {asTable ? (
            <DataTable caption={name} columns={TABLE_COLUMNS} rows={tableRows(plate)} sortedBy={{ key: "waited", descending: true }} />
          ) : (
            <Plate caption={name} columns={plateColumns(plate.tasks)} lines={plateLines(plate.rows)} tailLabel="Waits to be seen" />
          )}
        </Sheet>
      )}
    </Page>
  );
}

function ShowLink({ href, on, children }: { href: string; on: boolean; children: string }) {
  return (
    <Link href={href} aria-current={on ? "true" : undefined} className={`inline-flex min-h-11 items-center border-b-4 font-plate text-[1.15rem] font-semibold ${on ? "border-line" : "border-transparent text-ink2"}`}>
      {children}
    </Link>
  );
}

function nextLine({ rows }: CohortView["plate"]): string {
  const longest = rows.filter((row) => row.waitedDays !== null).toSorted((a, b) => (b.waitedDays ?? 0) - (a.waitedDays ?? 0))[0];
  const due = rows.reduce((sum, row) => sum + row.standings.filter((standing) => standing.held.kind === "recheck_due").length, 0);
  const waiting = longest ? `${longest.name} has waited ${longest.waitedDays} days to be observed on “${longest.waitsOn}”: ask for a date. ` : "Nobody waits to be observed. ";
  return `${waiting}${due === 0 ? "" : `${due} re-checks are due.`}`.trim();
}

const TABLE_COLUMNS = [
  { key: "name", label: "Apprentice" },
  { key: "workshop", label: "Workshop" },
  { key: "held", label: "Held and current", numeric: true },
  { key: "due", label: "Re-check due", numeric: true },
  { key: "notYet", label: "Not yet", numeric: true },
  { key: "waited", label: "Days waiting", numeric: true },
  { key: "waitsOn", label: "Waits on" },
];

function tableRows({ rows, tasks }: CohortView["plate"]) {
  const cell = (value: string | number) => ({ show: value, sort: value });
  return rows.map((row) => ({
    id: row.personId,
    cells: {
      name: cell(row.name),
      workshop: cell(row.workshop),
      held: { show: `${row.held} of ${tasks.length}`, sort: row.held },
      due: cell(row.standings.filter((standing) => standing.held.kind === "recheck_due").length),
      notYet: cell(row.standings.filter((standing) => standing.next === "not_yet").length),
      waited: { show: row.waitedDays ?? "–", sort: row.waitedDays ?? -1 },
      waitsOn: cell(row.waitsOn ?? ""),
    },
  }));
}
