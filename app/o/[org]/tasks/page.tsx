import type { Metadata } from "next";
import Link from "next/link";
import { PageHead } from "@/components/frame/page-head";
import { Page, Sheet } from "@/components/frame/sheet";
import { DataTable } from "@/components/ui/data-table";
import { EmptyPlace } from "@/components/ui/notice";
import { requireActor, view } from "@/lib/http/page";
import { viewTasks } from "@/lib/services/tasks/view-tasks";

export const metadata: Metadata = { title: "Tasks" };

const COLUMNS = [
  { key: "title", label: "Task" },
  { key: "area", label: "Area" },
  { key: "criteria", label: "Criteria", numeric: true },
  { key: "safety", label: "Safety-critical", numeric: true },
  { key: "current", label: "Current for, months", numeric: true },
];

export default async function TasksPage({ params }: { params: Promise<{ org: string }> }) {
  const { org } = await params;
  const actor = await requireActor(org, "/tasks");
  const tasks = await view(viewTasks(actor));
  return (
    <Page>
      <PageHead title="Tasks" next="What is observed and signed off. Modules prepare for them." />
      {tasks.length === 0 ? (
        <EmptyPlace title="No tasks yet">The college publishes its tasks; they appear here.</EmptyPlace>
      ) : (
        <Sheet>
          <DataTable
            caption="Tasks"
            columns={COLUMNS}
            rows={tasks.map(({ taskId, content }) => {
              const safety = content.criteria.filter((criterion) => criterion.safetyCritical).length;
              return {
                id: taskId,
                cells: {
                  title: {
                    show: (
                      <Link href={`/o/${org}/tasks/${taskId}`} className="font-semibold underline underline-offset-4">
                        {content.title}
                      </Link>
                    ),
                    sort: content.title,
                  },
                  area: { show: content.area, sort: content.area },
                  criteria: { show: content.criteria.length, sort: content.criteria.length },
                  safety: { show: safety, sort: safety },
                  current: { show: content.rule.currencyMonths, sort: content.rule.currencyMonths },
                },
              };
            })}
          />
        </Sheet>
      )}
    </Page>
  );
}
