import type { Metadata } from "next";
import { PageHead } from "@/components/frame/page-head";
import { Page } from "@/components/frame/sheet";
import { LearnPlayer } from "@/components/player/learn-player";
import { LinkButton } from "@/components/ui/button";
import { DemoBanner } from "@/components/ui/caution";
import { formatDay } from "@/lib/core/dates";
import { addressId, requireActor, view } from "@/lib/http/page";
import { viewLearning } from "@/lib/services/learning/view-learning";

export const metadata: Metadata = { title: "Module" };

export default async function LearnModulePage({ params }: { params: Promise<{ org: string; assignmentId: string }> }) {
  const { org, assignmentId } = await params;
  addressId(assignmentId);
  const actor = await requireActor(org, `/learn/${assignmentId}`);
  const module = await view(viewLearning(actor, assignmentId));
  return (
    <>
      {actor.organisation.isDemo && <DemoBanner />}
      <Page>
        <PageHead
          title={module.title}
          next={
            module.progress.knowledge.met
              ? `You know this. It opens: ${module.tasks.map((task) => task.title).join(", ") || "no task"}.`
              : `Watch it step by step and answer what it asks, by ${formatDay(module.dueOn)}.`
          }
          actions={
            module.progress.knowledge.met &&
            module.tasks.map((task) => (
              <LinkButton key={task.id} href={`/o/${org}/practice/${task.id}`} kind="main">
                To the task
              </LinkButton>
            ))
          }
        />
        <LearnPlayer
          params={{ org, assignmentId }}
          steps={module.steps}
          questions={module.questions}
          progress={module.progress}
          media={module.media}
        />
      </Page>
    </>
  );
}
