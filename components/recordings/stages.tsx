"use client";

import { api } from "@/components/api/client";
import { usePress } from "@/components/api/use-press";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { Progress } from "@/components/ui/progress";
import type { RecordingView, StageView } from "@/lib/schemas/recordings";

const NAMES: Record<StageView["stage"], string> = {
  probe: "Look at the film",
  "480p": "Film for phones (480p)",
  "720p": "Film for larger screens (720p)",
  poster: "Poster",
  storyboard: "Storyboard",
};

const STATES: Record<StageView["state"], string> = { waiting: "waits", running: "under way", done: "done", failed: "failed" };

type StagesProps = { org: string; recording: RecordingView; onStarted: () => void };

/** How far the preparing is, stage by stage, and why it stopped where it did. */
export function Stages({ org, recording, onStarted }: StagesProps) {
  const again = usePress(
    () => api("POST /orgs/{org}/recordings/{recordingId}/preparation", { params: { org, recordingId: recording.recordingId } }),
    onStarted,
  );
  return (
    <div className="grid gap-4">
      {recording.state === "failed" && (
        <Notice kind="error" title="This recording could not be prepared">
          <p>{recording.failure}</p>
          <p className="mt-1">What you sent is kept as it came. Try again, or put this away and add another film.</p>
        </Notice>
      )}
      <ol className="grid gap-2.5">
        {recording.stages.map((stage) => (
          <li key={stage.stage}>
            {stage.state === "running" ? (
              <Progress label={NAMES[stage.stage]} percent={stage.percent} />
            ) : (
              <div className="flex justify-between gap-3">
                <span>{NAMES[stage.stage]}</span>
                <span className={stage.state === "failed" ? "font-semibold text-paint-text" : "text-ink2"}>{STATES[stage.state]}</span>
              </div>
            )}
          </li>
        ))}
      </ol>
      {again.error && <Notice kind="error" title={again.error.message} />}
      {recording.state === "failed" && (
        <Button kind="main" className="justify-self-start" disabled={again.isPending} onClick={() => again.mutate(undefined)}>
          Try again
        </Button>
      )}
    </div>
  );
}
