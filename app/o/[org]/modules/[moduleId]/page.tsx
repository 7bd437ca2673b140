import type { Metadata } from "next";
import { PageHead } from "@/components/frame/page-head";
import { Page, Sheet, SheetPart } from "@/components/frame/sheet";
import { GivePanel } from "@/components/modules/give-panel";
import { ModuleForm } from "@/components/modules/module-form";
import { PublishPanel } from "@/components/modules/publish-panel";
import { DemoBanner } from "@/components/ui/caution";
import { Tag, Value } from "@/components/ui/tag";
import { formatDay } from "@/lib/core/dates";
import { addressId, requireActor, view } from "@/lib/http/page";
import { today } from "@/lib/services/clock";
import { viewModule, type ModuleView } from "@/lib/services/modules/view-module";

export const metadata: Metadata = { title: "Module" };

const DAY_MS = 86_400_000;

export default async function ModulePage({ params }: { params: Promise<{ org: string; moduleId: string }> }) {
  const { org, moduleId } = await params;
  addressId(moduleId);
  const actor = await requireActor(org, `/modules/${moduleId}`);
  const module = await view(viewModule(actor, moduleId));
  const newest = module.revisions[0];
  const day = today();
  const holding = new Set(module.holders.map((holder) => holder.apprenticeId));
  const { version, title, summary, passShare, stepIds, taskIds } = module;
  return (
    <>
      {actor.organisation.isDemo && <DemoBanner />}
      <Page>
        <PageHead title={module.title} next={nextLine(module)} />
        <div className="grid items-start gap-5 lg:grid-cols-[minmax(0,3fr)_minmax(0,2fr)]">
          <Sheet>
            <SheetPart title="Draft">
              <ModuleForm
                key={version}
                params={{ org, moduleId }}
                draft={{ version, title, summary, passShare, stepIds, taskIds }}
                availableSteps={module.availableSteps}
                tasks={module.tasks}
              />
            </SheetPart>
          </Sheet>
          <Sheet>
            <SheetPart title="Publish">
              <PublishPanel params={{ org, moduleId }} version={version} problems={module.problems} changed={module.changed} published={newest !== undefined} />
            </SheetPart>
            {newest && (
              <SheetPart title="Give it to apprentices">
                <GivePanel
                  params={{ org, moduleId }}
                  apprentices={module.apprentices.map((apprentice) => ({ ...apprentice, holds: holding.has(apprentice.id) }))}
                  today={day}
                  inTwoWeeks={new Date(Date.parse(day) + 14 * DAY_MS).toISOString().slice(0, 10)}
                />
              </SheetPart>
            )}
            {module.holders.length > 0 && (
              <SheetPart title="Who has it">
                <Holders module={module} />
              </SheetPart>
            )}
            {newest && (
              <SheetPart title="What was understood">
                <Understood questions={module.understood} />
              </SheetPart>
            )}
            {newest && (
              <SheetPart title="Revisions">
                <Revisions revisions={module.revisions} />
              </SheetPart>
            )}
          </Sheet>
        </div>
      </Page>
    </>
  );
}

function nextLine(module: ModuleView): string {
  if (module.revisions.length === 0) return module.problems.length > 0 ? "A draft. What is missing before publishing stands beside it." : "A draft. Publish it, then give it to apprentices.";
  if (module.changed) return "The draft changed since the newest revision. Publish it when it is ready.";
  return module.holders.length === 0 ? "Published. Give it to apprentices." : `Published and given to ${module.holders.length}.`;
}

function Holders({ module }: { module: ModuleView }) {
  return (
    <ul>
      {module.holders.map((holder) => (
        <li key={holder.assignmentId} className="flex flex-wrap justify-between gap-x-4 border-b border-rule py-2 last:border-b-0">
          <span className="font-semibold">{holder.name}</span>
          {holder.knowledgeMetAt ? (
            <Tag kind="strong">knows it</Tag>
          ) : (
            <span className="text-ink2">
              {holder.right} right of {holder.answered} answered, by {formatDay(holder.dueOn)}
            </span>
          )}
        </li>
      ))}
    </ul>
  );
}

/** First answers only: what somebody knew before going back. */
function Understood({ questions }: { questions: ModuleView["understood"] }) {
  const percent = (share: number) => Math.round(share * 100);
  return (
    <ul>
      {questions.map((question) => (
        <li key={question.id} className="border-b border-rule py-2 last:border-b-0">
          {question.prompt} {question.safetyCritical && <Tag kind="safety">safety</Tag>}
          <span className="block text-ink2">
            first answers: <Value>{`${question.first.right} of ${question.first.answers}`}</Value> right
            {question.first.share && (
              <>
                , <Value>{`${percent(question.first.share.low)}–${percent(question.first.share.high)} %`}</Value> (95 % interval
                {question.first.trust === "with_caution" ? ", few answers" : ""})
              </>
            )}
          </span>
        </li>
      ))}
    </ul>
  );
}

function Revisions({ revisions }: { revisions: ModuleView["revisions"] }) {
  return (
    <ol>
      {revisions.map((revision) => (
        <li key={revision.number} className="border-b border-rule py-2 last:border-b-0">
          <span className="font-semibold">Revision {revision.number}</span> · {formatDay(revision.publishedAt.toISOString().slice(0, 10))}, {revision.publishedBy}{" "}
          {revision.workChanged && <Tag>the work changed</Tag>}
          <span className="block text-sm text-ink2">
            <Value>{revision.contentHash.slice(0, 16)}…</Value>
          </span>
        </li>
      ))}
    </ol>
  );
}
