import type { Metadata } from "next";
import { Bolt } from "@/components/bolt/bolt";
import { PageHead } from "@/components/frame/page-head";
import { Page, Sheet, SheetPart } from "@/components/frame/sheet";
import { SignedCriteria } from "@/components/sign-offs/signed-criteria";
import { WithdrawForm } from "@/components/sign-offs/withdraw-form";
import { DemoBanner } from "@/components/ui/caution";
import { Notice } from "@/components/ui/notice";
import { Value } from "@/components/ui/tag";
import { formatDay } from "@/lib/core/dates";
import { standingLabel } from "@/lib/core/standing/standing-label";
import { LEVEL_LABEL } from "@/lib/core/tasks/types";
import { addressId, requireActor, view } from "@/lib/http/page";
import { viewSignOff, type SignOffView } from "@/lib/services/sign-offs/view-sign-off";

export const metadata: Metadata = { title: "Sign-off" };

type SignOffPageProps = { params: Promise<{ org: string; signOffId: string }>; searchParams: Promise<{ signed?: string }> };

export default async function SignOffPage({ params, searchParams }: SignOffPageProps) {
  const { org, signOffId } = await params;
  addressId(signOffId);
  const actor = await requireActor(org, `/sign-offs/${signOffId}`);
  const { signOff, marks, changes, held, canWithdraw, proof } = await view(viewSignOff(actor, signOffId));
  const standing = { held, next: signOff.outcome === "not_yet" ? ("not_yet" as const) : ("open" as const) };
  const justSigned = (await searchParams).signed === "now";
  return (
    <>
      {actor.organisation.isDemo && <DemoBanner />}
      <Page narrow>
        <PageHead
          title={`${signOff.content.title}: ${signOff.outcome === "met" ? "signed off" : "not yet"}`}
          next={`${signOff.apprentice}, seen by ${signOff.assessor} on ${formatDay(signOff.signedAt.toISOString().slice(0, 10))}.`}
        />
        <Sheet>
          <div className="flex flex-wrap items-center gap-6 border-b border-rule px-4 py-5 sm:px-5">
            <Bolt standing={standing} size={104} label="" drawn={justSigned} />
            <div>
              <p className="font-plate text-[1.5rem] font-semibold leading-tight">{standingLabel(standing)}</p>
              {signOff.level !== null && <p className="text-ink2">Level {signOff.level}: {LEVEL_LABEL[signOff.level]}</p>}
              <p className="mt-1 max-w-[52ch] text-sm text-ink2">This says what was seen on that day. It does not release a vehicle.</p>
            </div>
          </div>
          {changes.map((change) => (
            <div key={change.at.toISOString()} className="px-4 pt-4 sm:px-5">
              <Notice kind="error" title={`${change.kind === "withdrawal" ? "Withdrawn" : "Corrected"} on ${formatDay(change.at.toISOString().slice(0, 10))} by ${change.by}`}>
                {change.reason}
              </Notice>
            </div>
          ))}
          <SheetPart title="Who, what, where">
            <Facts signOff={signOff} />
          </SheetPart>
          {signOff.reasons.outcome.length > 0 && (
            <SheetPart title="Why not yet">
              <ul className="list-disc pl-5">
                {signOff.reasons.outcome.map((reason) => (
                  <li key={`${reason.key} ${reason.text}`}>{reason.text}</li>
                ))}
              </ul>
            </SheetPart>
          )}
          {signOff.feedback && <SheetPart title="The assessor’s words">{signOff.feedback}</SheetPart>}
          <SheetPart title="Criterion by criterion">
            <SignedCriteria criteria={signOff.content.criteria} marks={marks} />
          </SheetPart>
          <SheetPart title="Proof">
            <Proof proof={proof} organisation={signOff.organisation} />
          </SheetPart>
          {canWithdraw && (
            <SheetPart title="Withdraw">
              <WithdrawForm params={{ org, signOffId }} />
            </SheetPart>
          )}
        </Sheet>
      </Page>
    </>
  );
}

function Facts({ signOff }: { signOff: SignOffView["signOff"] }) {
  const rows: [string, string][] = [
    ["Apprentice", `${signOff.apprentice}, ${signOff.workshop}`],
    ["Assessor", `${signOff.assessor}, ${signOff.organisation}`],
    ["Vehicle", signOff.vehicle],
    ["Job card", signOff.jobCardNumber],
    ["Task", `${signOff.content.title}, revision ${signOff.revisionNumber}`],
    ["Begun", `${signOff.startedAt.toISOString().slice(0, 16).replace("T", " ")} UTC`],
    ["Signed", `${signOff.signedAt.toISOString().slice(0, 16).replace("T", " ")} UTC`],
    ...(signOff.currentUntil ? ([["Current until", formatDay(signOff.currentUntil)]] as [string, string][]) : []),
  ];
  return (
    <dl className="grid grid-cols-[8rem_1fr] gap-x-4 gap-y-1">
      {rows.map(([name, value]) => (
        <div key={name} className="contents">
          <dt className="text-ink2">{name}</dt>
          <dd>{value}</dd>
        </div>
      ))}
    </dl>
  );
}

function Proof({ proof, organisation }: { proof: SignOffView["proof"]; organisation: string }) {
  return (
    <div className="grid gap-2">
      <Notice kind={proof.holds ? "done" : "error"} title={proof.holds ? "The entry proves itself." : "The entry does not prove itself: it was altered."}>
        Entry {proof.leafIndex + 1} of {proof.treeSize} in the ledger of {organisation}, recomputed now.
      </Notice>
      <p className="text-sm text-ink2">
        Leaf <Value className="break-all !whitespace-normal">{proof.leafHash}</Value>
      </p>
      <p className="text-sm text-ink2">
        Root <Value className="break-all !whitespace-normal">{proof.root}</Value>
      </p>
    </div>
  );
}
