import type { Metadata } from "next";
import Link from "next/link";
import { PageHead } from "@/components/frame/page-head";
import { Page, Sheet } from "@/components/frame/sheet";
import { NewModule } from "@/components/modules/new-module";
import { DataTable, type Row } from "@/components/ui/data-table";
import { EmptyPlace } from "@/components/ui/notice";
import { formatDay } from "@/lib/core/dates";
import { requireActor, view } from "@/lib/http/page";
import { viewModules, type ModulesView } from "@/lib/services/modules/view-modules";

export const metadata: Metadata = { title: "Modules" };

const COLUMNS = [
  { key: "title", label: "Module" },
  { key: "steps", label: "Steps", numeric: true },
  { key: "questions", label: "Questions", numeric: true },
  { key: "revision", label: "Published" },
  { key: "holders", label: "Given to" },
];

export default async function ModulesPage({ params }: { params: Promise<{ org: string }> }) {
  const { org } = await params;
  const actor = await requireActor(org, "/modules");
  const { modules, recordings } = await view(viewModules(actor));
  return (
    <Page>
      <PageHead title="Modules" next="Steps out of recordings, with a rule for what must be known. Publishing freezes one." actions={<NewModule org={org} recordings={recordings} />} />
      {modules.length === 0 ? (
        <EmptyPlace title="No modules yet" action={<NewModule org={org} recordings={recordings} />}>
          Mark out a recording first, then its steps become a module.
        </EmptyPlace>
      ) : (
        <Sheet>
          <DataTable caption="Modules" columns={COLUMNS} rows={modules.map((module) => rowOf(org, module))} />
        </Sheet>
      )}
    </Page>
  );
}

function rowOf(org: string, module: ModulesView["modules"][number]): Row {
  const published = module.publishedAt ? `revision ${module.newestNumber}, ${formatDay(module.publishedAt.toISOString().slice(0, 10))}` : "draft";
  return {
    id: module.id,
    cells: {
      title: {
        show: (
          <Link href={`/o/${org}/modules/${module.id}`} className="font-semibold underline underline-offset-4">
            {module.title}
          </Link>
        ),
        sort: module.title,
      },
      steps: { show: module.steps, sort: module.steps },
      questions: { show: module.questions, sort: module.questions },
      revision: { show: published, sort: module.publishedAt?.getTime() ?? 0 },
      holders: { show: module.holders === 0 ? "nobody" : `${module.holders}, ${module.knowing} know it`, sort: module.holders },
    },
  };
}
