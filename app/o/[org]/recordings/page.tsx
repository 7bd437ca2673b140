import type { Metadata } from "next";
import Link from "next/link";
import { PageHead } from "@/components/frame/page-head";
import { Page, Sheet } from "@/components/frame/sheet";
import { AddRecording } from "@/components/recordings/add-recording";
import { RefreshWhile } from "@/components/recordings/refresh-while";
import { UnfinishedUploads } from "@/components/recordings/unfinished-uploads";
import { DataTable, type Row } from "@/components/ui/data-table";
import { Tag } from "@/components/ui/tag";
import { formatDay } from "@/lib/core/dates";
import { formatClock } from "@/lib/core/webvtt/timestamps";
import { requireActor, view } from "@/lib/http/page";
import type { RecordingListItem } from "@/lib/schemas/recordings";
import { viewRecordings } from "@/lib/services/recordings/view-recordings";
import { viewOpenUploads } from "@/lib/services/uploads/view-open-uploads";

export const metadata: Metadata = { title: "Recordings" };

const COLUMNS = [
  { key: "title", label: "Recording" },
  { key: "state", label: "State" },
  { key: "length", label: "Length", numeric: true },
  { key: "vehicle", label: "Vehicle" },
  { key: "steps", label: "Steps", numeric: true },
  { key: "by", label: "Filmed by" },
  { key: "at", label: "Added" },
];

export default async function RecordingsPage({ params }: { params: Promise<{ org: string }> }) {
  const { org } = await params;
  const actor = await requireActor(org, "/recordings");
  const recordings = await view(viewRecordings(actor));
  const unfinished = (await viewOpenUploads(actor)).filter((upload) => upload.purpose === "recording");
  return (
    <Page>
      <PageHead title="Recordings" next={nextOf(recordings)} />
      <RefreshWhile active={recordings.some((recording) => recording.state === "processing")} />
      <div className="grid gap-4">
        <AddRecording org={org} isFirst={recordings.length === 0} />
        <UnfinishedUploads org={org} uploads={unfinished} />
        {recordings.length > 0 && (
          <Sheet>
            <DataTable
              caption="Recordings"
              columns={COLUMNS}
              rows={recordings.map((recording) => rowOf(org, recording))}
              sortedBy={{ key: "at", descending: true }}
            />
          </Sheet>
        )}
      </div>
    </Page>
  );
}

function nextOf(recordings: readonly RecordingListItem[]): string {
  const failed = recordings.filter((recording) => recording.state === "failed").length;
  const unmarked = recordings.filter((recording) => recording.state === "ready" && recording.steps === 0).length;
  if (failed > 0) return `${failed === 1 ? "One could not be prepared" : `${failed} could not be prepared`}. Open it to see why.`;
  if (unmarked > 0) return `${unmarked === 1 ? "One is ready" : `${unmarked} are ready`} to be marked out.`;
  return recordings.length === 0 ? "Add the first one." : "Every recording that is ready is marked out.";
}

function rowOf(org: string, recording: RecordingListItem): Row {
  const { recordingId, title, state, percent, durationMs, vehicle, steps, recordedBy, createdAt } = recording;
  return {
    id: recordingId,
    cells: {
      title: {
        show: (
          <Link className="flex items-center gap-3 underline underline-offset-4" href={`/o/${org}/recordings/${recordingId}`}>
            <Thumb poster={recording.poster} />
            <span className="min-w-0 break-words font-semibold">{title}</span>
          </Link>
        ),
        sort: title,
      },
      state: { show: <StateTag recording={recording} />, sort: `${state} ${percent}` },
      length: { show: durationMs === null ? "–" : formatClock(durationMs), sort: durationMs ?? -1 },
      vehicle: { show: vehicle ?? "–", sort: vehicle ?? "" },
      steps: { show: steps, sort: steps },
      by: { show: recordedBy, sort: recordedBy },
      at: { show: formatDay(createdAt.slice(0, 10)), sort: Date.parse(createdAt) },
    },
  };
}

function StateTag({ recording: { state, percent, failure } }: { recording: RecordingListItem }) {
  if (state === "ready") return <Tag kind="strong">ready</Tag>;
  if (state === "processing") return <Tag>being prepared, {percent} %</Tag>;
  return (
    <span className="grid justify-items-start gap-1">
      <Tag>not prepared</Tag>
      <span className="max-w-[40ch] text-sm text-ink2">{failure}</span>
    </span>
  );
}

function Thumb({ poster }: { poster: string | null }) {
  return (
    <span className="grid h-11 w-19 shrink-0 place-items-center overflow-hidden rounded bg-film">
      {/* The store's own signed picture: the framework's image service would fetch it once more through the server. */}
      {/* eslint-disable-next-line @next/next/no-img-element */}
      {poster && <img src={poster} alt="" className="max-h-11" loading="lazy" />}
    </span>
  );
}
