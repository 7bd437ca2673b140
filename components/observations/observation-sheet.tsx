"use client";

import { useState } from "react";
import { Clock } from "@/components/observations/clock";
import { CriterionRow, type SheetInstrument } from "@/components/observations/criterion-row";
import { SignPanel } from "@/components/observations/sign-panel";
import { StopPanel } from "@/components/observations/stop-panel";
import { useMarks, type SheetMark } from "@/components/observations/use-marks";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import type { TaskContent } from "@/lib/core/tasks/types";

type ObservationSheetProps = {
  params: { org: string; observationId: string };
  apprentice: string;
  content: TaskContent;
  vehicle: string;
  jobCardNumber: string;
  startedAt: string;
  stoppedReason: string | null;
  marks: SheetMark[];
  instruments: SheetInstrument[];
  photos: { id: string; note: string; url: string }[];
  today: string;
};

/** The sheet in one hand at the vehicle: any order, what is missing always in sight, kept as it is filled. */
export function ObservationSheet(props: ObservationSheetProps) {
  const { params, content } = props;
  const { markOf, kept, refusals, change } = useMarks(params, props.marks);
  const [panel, setPanel] = useState<"stop" | "sign" | null>(null);
  const [stoppedReason, setStoppedReason] = useState(props.stoppedReason);
  const open = content.criteria.filter((criterion) => markOf(criterion.key).mark === null);
  const openSafety = open.filter((criterion) => criterion.safetyCritical).length;
  const filled = content.criteria.length - open.length;
  const finished = (open.length === 0 || stoppedReason !== null) && kept.kind === "kept";
  const groups = [...new Set(content.criteria.map((criterion) => criterion.group))];

  return (
    <main id="main" tabIndex={-1} className="mx-auto min-h-dvh max-w-3xl bg-sheet pb-40 outline-none md:pb-24">
      <header data-on-deep className="sticky top-0 z-10 flex items-center gap-4 bg-deep px-4 py-3 text-deep-ink">
        <div className="min-w-0 flex-1">
          <h1 className="text-[1.45rem] leading-tight">{content.title}</h1>
          <p className="text-sm text-deep-soft" role="status">
            {props.apprentice} · {props.vehicle} · {props.jobCardNumber} ·{" "}
            {kept.kind === "kept" ? "kept" : kept.kind === "sending" ? "being kept" : "kept here, sent when back online"}
          </p>
        </div>
        <Clock since={props.startedAt} />
      </header>
      {stoppedReason && <p className="border-b border-rule bg-ink px-4 py-3 font-semibold text-chalk">Stopped for safety: {stoppedReason}. This can only end as “not yet”.</p>}
      {props.photos.length > 0 && <Photos photos={props.photos} />}
      {groups.map((group) => (
        <section key={group} aria-label={group || "Criteria"}>
          {group && <h2 className="border-b border-rule bg-enamel px-4 py-1.5 text-[1.15rem]">{group}</h2>}
          <ul>
            {content.criteria
              .filter((criterion) => criterion.group === group)
              .map((criterion) => (
                <CriterionRow
                  key={criterion.key}
                  criterion={criterion}
                  mark={markOf(criterion.key)}
                  refusal={refusals.get(criterion.key)}
                  instruments={props.instruments}
                  today={props.today}
                  onChange={(patch) => change(criterion.key, patch)}
                />
              ))}
          </ul>
        </section>
      ))}
      <footer className="fixed inset-x-0 bottom-15 z-10 border-t-2 border-steel bg-sheet md:bottom-0">
        <div className="mx-auto flex max-w-3xl flex-wrap items-center justify-between gap-x-3 gap-y-2 px-4 py-2.5">
          <p className="text-[0.95rem] leading-tight">
            <b>
              {filled} of {content.criteria.length}
            </b>{" "}
            filled
            <span className="block text-ink2">{open.length === 0 ? "nothing left" : `${open.length} left${openSafety > 0 ? `, ${openSafety} safety` : ""}`}</span>
          </p>
          <div className="flex gap-2">
            {!stoppedReason && <Button onClick={() => setPanel("stop")}>Stop for safety</Button>}
            {finished ? (
              <Button kind="main" onClick={() => setPanel("sign")}>
                Outcome
              </Button>
            ) : (
              <Button kind="main" onClick={() => document.getElementById(`criterion-${open[0]?.key}`)?.scrollIntoView({ block: "center" })} disabled={open.length === 0}>
                Next open
              </Button>
            )}
          </div>
        </div>
      </footer>
      <Dialog open={panel === "stop"} onClose={() => setPanel(null)} title="Stop for safety">
        <StopPanel
          params={params}
          onStopped={(reason) => {
            setStoppedReason(reason);
            setPanel(null);
          }}
        />
      </Dialog>
      <Dialog open={panel === "sign"} onClose={() => setPanel(null)} title="Outcome">
        <SignPanel params={params} apprentice={props.apprentice} />
      </Dialog>
    </main>
  );
}

function Photos({ photos }: { photos: ObservationSheetProps["photos"] }) {
  return (
    <details className="border-b border-rule px-4 py-2">
      <summary className="min-h-11 py-2 font-plate text-[1.15rem] font-semibold">Photos added as evidence ({photos.length})</summary>
      <ul className="grid grid-cols-2 gap-3 py-2 sm:grid-cols-3">
        {photos.map((photo) => (
          <li key={photo.id}>
            {/* eslint-disable-next-line @next/next/no-img-element -- a signed address of the store; the framework's optimiser must not fetch it */}
            <img src={photo.url} alt={photo.note || "Photo of the work"} className="aspect-square w-full rounded border border-rule object-cover" />
          </li>
        ))}
      </ul>
    </details>
  );
}
