import type { Metadata } from "next";
import Link from "next/link";
import { StandingLine } from "@/components/bolt/standing-line";
import { PageHead } from "@/components/frame/page-head";
import { Page, Sheet, SheetPart } from "@/components/frame/sheet";
import { LinkButton } from "@/components/ui/button";
import { EmptyPlace } from "@/components/ui/notice";
import { requireActor, view } from "@/lib/http/page";
import { viewPractice, type PracticeItem } from "@/lib/services/practice/view-practice";

export const metadata: Metadata = { title: "Tasks" };

export default async function PracticePage({ params }: { params: Promise<{ org: string }> }) {
  const { org } = await params;
  const actor = await requireActor(org, "/practice");
  const items = await view(viewPractice(actor));
  const areas = [...new Set(items.map((item) => item.area))];
  const waiting = items.filter((item) => item.readySince !== null).length;
  return (
    <Page narrow>
      <PageHead
        title="Tasks"
        next={waiting > 0 ? `You said “ready” on ${waiting}. An assessor sees it.` : "Practise a task, add a photo, then say that you are ready to be seen."}
        actions={<LinkButton href="/legend">What the bolts mean</LinkButton>}
      />
      {items.length === 0 && <EmptyPlace title="No tasks yet">Your workshop or college publishes the tasks that you are signed off on.</EmptyPlace>}
      <Sheet>
        {areas.map((area) => (
          <SheetPart key={area} title={area}>
            <ul>
              {items
                .filter((item) => item.area === area)
                .map((task) => (
                  <TaskRow key={task.taskId} org={org} task={task} />
                ))}
            </ul>
          </SheetPart>
        ))}
      </Sheet>
    </Page>
  );
}

function TaskRow({ org, task }: { org: string; task: PracticeItem }) {
  const hint = task.standing.next === "not_open" ? "Learn its module first." : task.missing[0];
  return (
    <li className="border-b border-rule last:border-b-0">
      <Link href={`/o/${org}/practice/${task.taskId}`} className="grid min-h-16 gap-1 py-3 hover:bg-tint">
        <span className="font-plate text-[1.3rem] font-semibold leading-tight">{task.title}</span>
        <StandingLine standing={task.standing} size={36} />
        {hint && task.standing.held.kind === "nothing" && <span className="text-sm text-ink2">{hint}</span>}
      </Link>
    </li>
  );
}
