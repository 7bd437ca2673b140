"use client";

import { useQuery } from "@tanstack/react-query";
import Link from "next/link";
import { api } from "@/components/api/client";
import { PageHead } from "@/components/frame/page-head";
import { Sheet, SheetPart } from "@/components/frame/sheet";
import { CaptionsForm } from "@/components/recordings/captions-form";
import { DetailsForm, type Vehicle } from "@/components/recordings/details-form";
import { Film } from "@/components/recordings/film";
import { PutAway } from "@/components/recordings/put-away";
import { Stages } from "@/components/recordings/stages";
import { LinkButton } from "@/components/ui/button";
import { formatBytes } from "@/components/upload/format-bytes";
import { formatDay } from "@/lib/core/dates";
import { formatClock } from "@/lib/core/webvtt/timestamps";
import type { Media } from "@/lib/schemas/media";
import type { RecordingView } from "@/lib/schemas/recordings";

const LOOK_EVERY_MS = 1500;

type RecordingSheetProps = { org: string; first: RecordingView; firstMedia: Media; vehicles: readonly Vehicle[] };

/** One recording: its film, how far its preparing is, its details, and where it is used. Looks again by itself until it is prepared. */
export function RecordingSheet({ org, first, firstMedia, vehicles }: RecordingSheetProps) {
  const params = { org, recordingId: first.recordingId };
  const { data: recording, refetch } = useQuery({
    queryKey: ["recording", params],
    queryFn: ({ signal }) => api("GET /orgs/{org}/recordings/{recordingId}", { params, signal }),
    initialData: first,
    refetchInterval: (query) => (query.state.data?.state === "processing" ? LOOK_EVERY_MS : false),
  });
  const done = recording.stages.filter((stage) => stage.state === "done").length;
  const { data: media, refetch: signAgain } = useQuery({
    queryKey: ["recording-media", params, done],
    queryFn: ({ signal }) => api("GET /orgs/{org}/recordings/{recordingId}/media", { params, signal }),
    placeholderData: (before) => before ?? firstMedia,
    staleTime: 3600_000,
  });
  const playable = media ?? firstMedia;
  const canMarkOut = recording.durationMs !== null && playable.p480 !== null;
  return (
    <>
      <PageHead
        title={recording.title}
        next={nextOf(recording)}
        actions={
          canMarkOut && (
            <LinkButton kind={recording.state === "ready" ? "main" : "plain"} href={`/o/${org}/recordings/${recording.recordingId}/bench`}>
              Mark out
            </LinkButton>
          )
        }
      />
      <div className="grid items-start gap-4 lg:grid-cols-[minmax(0,1.6fr)_minmax(20rem,1fr)]">
        <div className="grid gap-4">
          <Film media={playable} title={recording.title} isFailed={recording.state === "failed"} onStale={() => void signAgain()} />
          <Sheet>
            <SheetPart title="Details">
              <DetailsForm org={org} recording={recording} vehicles={vehicles} onKept={() => void refetch()} />
            </SheetPart>
          </Sheet>
        </div>
        <Sheet>
          <SheetPart title={recording.state === "ready" ? "Prepared" : "Preparing"}>
            <Stages org={org} recording={recording} onStarted={() => void refetch()} />
          </SheetPart>
          <SheetPart title="The film">
            <Facts recording={recording} />
          </SheetPart>
          {recording.durationMs !== null && (
            <SheetPart title="Captions">
              <CaptionsForm
                org={org}
                recordingId={recording.recordingId}
                languages={playable.captions.map((track) => track.language)}
                onTaken={() => void signAgain()}
              />
            </SheetPart>
          )}
          <SheetPart title="Modules">
            {recording.modules.length === 0 ? (
              <div className="grid justify-items-start gap-2">
                <p className="text-ink2">No module is made of it yet.</p>
                <PutAway org={org} recordingId={recording.recordingId} />
              </div>
            ) : (
              <ul>
                {recording.modules.map((module) => (
                  <li key={module.moduleId}>
                    <Link className="inline-flex min-h-11 items-center underline underline-offset-4" href={`/o/${org}/modules/${module.moduleId}`}>
                      {module.title}
                    </Link>
                  </li>
                ))}
              </ul>
            )}
          </SheetPart>
        </Sheet>
      </div>
    </>
  );
}

function nextOf({ state, steps, questions, consent, privateDetailsCheckedAt, durationMs }: RecordingView): string {
  if (state === "failed") return "See why it could not be prepared, and try again.";
  if (state === "processing") return durationMs === null ? "It is being prepared. You can leave this page." : "It is being prepared. Meanwhile, fill in its details.";
  if (steps === 0) return "Mark it out into steps.";
  if (!consent) return "Say whose consent it has.";
  if (!privateDetailsCheckedAt) return "Look for plates and papers before anybody else sees it.";
  return `${steps} steps and ${questions} questions are marked out.`;
}

function Facts({ recording }: { recording: RecordingView }) {
  const { durationMs, width, height, hasSound, fileName, sizeBytes, recordedBy, createdAt, steps, questions } = recording;
  const facts: [string, string][] = [
    ["Length", durationMs === null ? "not measured yet" : formatClock(durationMs)],
    ["Picture", width && height ? `${width} × ${height}` : "–"],
    ["Sound", hasSound === null ? "–" : hasSound ? "yes" : "none"],
    ["Marked out", `${steps} steps, ${questions} questions`],
    ["Filmed by", recordedBy],
    ["Added", formatDay(createdAt.slice(0, 10))],
    ["File", `${fileName ? `${fileName}, ` : ""}${formatBytes(sizeBytes)}`],
  ];
  return (
    <dl className="grid grid-cols-[7rem_minmax(0,1fr)] gap-x-3 gap-y-1">
      {facts.map(([name, value]) => (
        <div key={name} className="contents">
          <dt className="text-ink2">{name}</dt>
          <dd className="break-words">{value}</dd>
        </div>
      ))}
    </dl>
  );
}
