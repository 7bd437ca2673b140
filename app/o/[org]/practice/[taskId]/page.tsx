import type { Metadata } from "next";
import Link from "next/link";
import { StandingLine } from "@/components/bolt/standing-line";
import { PageHead } from "@/components/frame/page-head";
import { Page, Sheet, SheetPart } from "@/components/frame/sheet";
import { CriteriaList } from "@/components/practice/criteria-list";
import { EvidencePhotos } from "@/components/practice/evidence-photos";
import { ReadyPress } from "@/components/practice/ready-press";
import { RunForm } from "@/components/practice/run-form";
import { DemoBanner } from "@/components/ui/caution";
import { Tag } from "@/components/ui/tag";
import { formatDay } from "@/lib/core/dates";
import { addressId, requireActor, view } from "@/lib/http/page";
import { today } from "@/lib/services/clock";
import { viewPracticeTask, type PracticeTaskView } from "@/lib/services/practice/view-practice-task";

export const metadata: Metadata = { title: "Task" };

export default async function PracticeTaskPage({ params }: { params: Promise<{ org: string; taskId: string }> }) {
  const { org, taskId } = await params;
  addressId(taskId);
  const actor = await requireActor(org, `/practice/${taskId}`);
  const task = await view(viewPracticeTask(actor, taskId));
  const { content, standing } = task;
  const isOpen = standing.next !== "not_open";
  return (
    <>
      {actor.organisation.isDemo && <DemoBanner />}
      <Page narrow>
        <PageHead title={content.title} next={nextLine(task)} />
        <Sheet>
          <SheetPart title="Where you stand">
            <StandingLine standing={standing} size={64} />
            {isOpen && (
              <div className="mt-4">
                <ReadyPress params={{ org, taskId }} ready={task.readySince !== null} missing={task.missing} />
              </div>
            )}
          </SheetPart>
          {task.history[0] && <LastObservation org={org} observation={task.history[0]} />}
          {task.modules.length > 0 && (
            <SheetPart title="To learn for it">
              <ul>
                {task.modules.map((module) => (
                  <li key={module.assignmentId}>
                    <Link className="inline-flex min-h-11 items-center gap-3 underline underline-offset-4" href={`/o/${org}/learn/${module.assignmentId}`}>
                      {module.title} {module.known && <Tag kind="strong">known</Tag>}
                    </Link>
                  </li>
                ))}
              </ul>
            </SheetPart>
          )}
          {isOpen && (
            <>
              <SheetPart title={`Photos of your work (${task.evidence.length} of ${content.rule.evidencePhotos})`}>
                <EvidencePhotos params={{ org, taskId }} photos={task.evidence} />
              </SheetPart>
              <SheetPart title={`Practice runs (${task.runs.length} of ${content.rule.practiceRuns})`}>
                <Runs runs={task.runs} />
                <RunForm params={{ org, taskId }} today={today()} />
              </SheetPart>
            </>
          )}
          <SheetPart title="What the assessor will look at">
            <p className="mb-1 text-ink2">{content.conditions}</p>
            <CriteriaList criteria={content.criteria} />
          </SheetPart>
        </Sheet>
      </Page>
    </>
  );
}

function nextLine({ standing, bookedFor, readySince, missing }: PracticeTaskView): string {
  if (standing.next === "not_open") return "Learn the module that opens this task.";
  if (bookedFor) return `You will be observed on ${formatDay(bookedFor.toISOString().slice(0, 10))}.`;
  if (readySince) return `Ready since ${formatDay(readySince.toISOString().slice(0, 10))}. An assessor sees it and makes a date.`;
  if (missing.length > 0) return `Before you can be seen: ${missing.join(" ")}`;
  return "Everything is there. Say that you are ready.";
}

function Runs({ runs }: { runs: PracticeTaskView["runs"] }) {
  return (
    <ul className="mb-3">
      {runs.map((run) => (
        <li key={run.id} className="border-b border-rule py-2">
          <span className="font-semibold">{formatDay(run.doneOn)}</span> · {run.vehicle} · {run.minutes} min{" "}
          {run.confirmedBy ? <Tag kind="strong">seen by {run.confirmedBy}</Tag> : <Tag>waits for a mentor</Tag>}
          {run.note && <span className="block text-ink2">{run.note}</span>}
        </li>
      ))}
    </ul>
  );
}

function LastObservation({ org, observation }: { org: string; observation: PracticeTaskView["history"][number] }) {
  return (
    <SheetPart title={`Last seen: ${observation.outcome === "met" ? "met" : "not yet"}`}>
      <p className="text-ink2">
        {formatDay(observation.signedAt.toISOString().slice(0, 10))}, {observation.assessor}, {observation.vehicle}
      </p>
      {observation.reasons.length > 0 && (
        <ul className="mt-1 list-disc pl-5">
          {observation.reasons.map((reason) => (
            <li key={reason}>{reason}</li>
          ))}
        </ul>
      )}
      {observation.feedback && <p className="mt-1">“{observation.feedback}”</p>}
      <Link className="inline-flex min-h-11 items-center underline underline-offset-4" href={`/o/${org}/sign-offs/${observation.signOffId}`}>
        The whole sheet
      </Link>
    </SheetPart>
  );
}
