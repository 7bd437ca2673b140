import type { Metadata } from "next";
import Link from "next/link";
import { PageHead } from "@/components/frame/page-head";
import { Page, Sheet } from "@/components/frame/sheet";
import { EmptyPlace } from "@/components/ui/notice";
import { Tag } from "@/components/ui/tag";
import { formatDay } from "@/lib/core/dates";
import { formatClock } from "@/lib/core/webvtt/timestamps";
import { requireActor, view } from "@/lib/http/page";
import { viewGiven } from "@/lib/services/learning/view-given";

export const metadata: Metadata = { title: "Modules" };

export default async function LearnPage({ params }: { params: Promise<{ org: string }> }) {
  const { org } = await params;
  const actor = await requireActor(org, "/learn");
  const given = await view(viewGiven(actor));
  const open = given.filter((module) => !module.knowledgeMetAt).length;
  return (
    <Page narrow>
      <PageHead title="Modules" next={open === 0 ? "You know everything that you were given." : `${open} to learn. What is due first is on top.`} />
      {given.length === 0 ? (
        <EmptyPlace title="Nothing was given to you yet">A mentor gives you modules; you get a mail when it happens.</EmptyPlace>
      ) : (
        <Sheet>
          <ul>
            {given.map((module) => (
              <li key={module.assignmentId} className="border-b border-rule last:border-b-0">
                <Link href={`/o/${org}/learn/${module.assignmentId}`} className="flex min-h-16 flex-wrap items-center justify-between gap-x-4 gap-y-1 px-4 py-3 hover:bg-tint">
                  <span className="min-w-0">
                    <span className="block font-plate text-[1.35rem] font-semibold leading-tight">{module.title}</span>
                    <span className="text-ink2">
                      {module.steps} steps, {formatClock(module.lengthMs)} · {module.right} of {module.questions} questions right
                    </span>
                  </span>
                  {module.knowledgeMetAt ? <Tag kind="strong">known</Tag> : <Tag>by {formatDay(module.dueOn)}</Tag>}
                </Link>
              </li>
            ))}
          </ul>
        </Sheet>
      )}
    </Page>
  );
}
