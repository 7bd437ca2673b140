import type { Metadata } from "next";
import { PageHead } from "@/components/frame/page-head";
import { Page, Sheet, SheetPart } from "@/components/frame/sheet";
import { CriteriaList } from "@/components/practice/criteria-list";
import { DemoBanner } from "@/components/ui/caution";
import { LEVEL_LABEL, type TaskRule } from "@/lib/core/tasks/types";
import { addressId, requireActor, view } from "@/lib/http/page";
import { viewTask } from "@/lib/services/tasks/view-tasks";

export const metadata: Metadata = { title: "Task" };

export default async function TaskPage({ params }: { params: Promise<{ org: string; taskId: string }> }) {
  const { org, taskId } = await params;
  addressId(taskId);
  const actor = await requireActor(org, `/tasks/${taskId}`);
  const task = await view(viewTask(actor, taskId));
  return (
    <>
      {actor.organisation.isDemo && <DemoBanner />}
      <Page narrow>
        <PageHead title={task.content.title} next={task.content.conditions} />
        <Sheet>
          <SheetPart title={`Criteria (${task.content.criteria.length})`}>
            <CriteriaList criteria={task.content.criteria} />
          </SheetPart>
          <SheetPart title="Rule">
            <ul className="list-disc pl-5">
              {ruleLines(task.content.rule).map((line) => (
                <li key={line}>{line}</li>
              ))}
            </ul>
          </SheetPart>
        </Sheet>
        <p className="mt-3 text-sm text-ink2">Revision {task.number}. What was published is never edited.</p>
      </Page>
    </>
  );
}

function ruleLines(rule: TaskRule): string[] {
  return [
    `Before “ready”: ${rule.practiceRuns} practice runs and ${rule.evidencePhotos} photos.`,
    `A sign-off stays current for ${rule.currencyMonths} months.`,
    ...(rule.independence ? ["The assessor doesn’t work at the apprentice’s workshop."] : []),
    ...(rule.minimumAgeAlone === null ? [] : [`Under ${rule.minimumAgeAlone}, a mentor stays alongside.`]),
    ...(rule.licence === null ? [] : [`Above level 2 only with the licence “${rule.licence}”.`]),
    ...rule.levelNeeds.map(
      (need) => `Level ${need.level}, ${LEVEL_LABEL[need.level]}: ${need.observations} met observations, ${need.vehicles} vehicles, ${need.assessors} assessors.`,
    ),
  ];
}
