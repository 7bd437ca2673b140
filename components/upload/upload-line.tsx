"use client";

import Link from "next/link";
import { Progress } from "@/components/ui/progress";
import { formatBytes } from "@/components/upload/format-bytes";
import { formatLeft } from "@/components/upload/rate-meter";
import { cancelUpload, dismissUpload, retryUpload, type RunningUpload } from "@/components/upload/running-uploads";

/** One file on its way: how far it is, how long it takes, and what can be done about it. */
export function UploadLine({ upload }: { upload: RunningUpload }) {
  const { key, org, file, state, outcome, problem } = upload;
  if (outcome) {
    return (
      <Line>
        <p role="status">
          <strong>{file.name}</strong> has arrived and is being prepared.
        </p>
        <Link className={PRESS} href={`/o/${org}/recordings/${outcome.recordingId}`} onClick={() => dismissUpload(key)}>
          Open the recording
        </Link>
        <Press label="Close" about={file.name} onClick={() => dismissUpload(key)} />
      </Line>
    );
  }
  if (problem) {
    return (
      <Line>
        <p role="alert" className="min-w-0 flex-1">
          <strong>{file.name}</strong> was not added. {problem}
        </p>
        <Press label="Try again" about={file.name} onClick={() => retryUpload(key)} />
        <Press label="Close" about={file.name} onClick={() => dismissUpload(key)} />
      </Line>
    );
  }
  const percent = state && state.totalBytes > 0 ? (state.sentBytes / state.totalBytes) * 100 : 0;
  return (
    <Line>
      <div className="min-w-0 flex-1 basis-60">
        <Progress label={file.name} percent={percent} detail={wordsOf(upload)} />
      </div>
      <Press label="Give up" about={file.name} onClick={() => cancelUpload(key)} />
    </Line>
  );
}

function wordsOf({ state, file }: RunningUpload): string {
  switch (state?.phase) {
    case undefined:
      return "waits for its turn";
    case "starting":
      return "starts";
    case "waiting":
      return "connection lost, goes on by itself";
    case "elsewhere":
      return "another tab is sending it";
    case "checking":
      return "being put together";
    case "sending":
      return [`${formatBytes(state.sentBytes)} of ${formatBytes(file.size)}`, state.leftMs === null ? "" : formatLeft(state.leftMs)].filter(Boolean).join(", ");
  }
}

const PRESS = "inline-flex min-h-11 items-center px-2 font-semibold text-strong underline underline-offset-4";

function Line({ children }: { children: React.ReactNode }) {
  return <li className="flex flex-wrap items-center gap-x-4 gap-y-1">{children}</li>;
}

function Press({ label, about, onClick }: { label: string; about: string; onClick: () => void }) {
  return (
    <button type="button" className={PRESS} onClick={onClick}>
      {label}
      <span className="sr-only"> {about}</span>
    </button>
  );
}
