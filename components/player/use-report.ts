"use client";

import { useCallback, useEffect, useRef } from "react";
import { api, doorPath } from "@/components/api/client";
import type { SpanRecorder } from "@/components/player/span-recorder";
import type { LearningProgress } from "@/lib/schemas/assignments";

/** Short enough that little is lost with a flat battery, long enough not to be a burden on workshop wi-fi. */
const REPORT_EVERY_MS = 5000;

type ReportOptions = {
  params: { org: string; assignmentId: string };
  recorder: SpanRecorder;
  recordingId: () => string;
  rate: () => number;
  onProgress: (progress: LearningProgress) => void;
};

/** Tells the server what was played: every few seconds, on demand, and when the page is left. What can't be sent is kept and sent later. */
export function useReport({ params, recorder, recordingId, rate, onProgress }: ReportOptions) {
  const sending = useRef(false);
  const send = useCallback(
    async (evenEmpty = false) => {
      if (sending.current) return;
      const spans = recorder.take().map(([start, end]): [number, number] => [start, end]);
      if (spans.length === 0 && !evenEmpty) return;
      sending.current = true;
      try {
        const body = { recordingId: recordingId(), spans, rate: rate() };
        onProgress(await api("POST /orgs/{org}/assignments/{assignmentId}/spans", { params, body }));
      } catch {
        recorder.putBack(spans);
      } finally {
        sending.current = false;
      }
    },
    [params, recorder, recordingId, rate, onProgress],
  );

  useEffect(() => {
    const timer = setInterval(() => void send(), REPORT_EVERY_MS);
    const leave = () => {
      const spans = recorder.take();
      if (spans.length === 0) return;
      const body = JSON.stringify({ recordingId: recordingId(), spans, rate: rate() });
      void fetch(doorPath("POST /orgs/{org}/assignments/{assignmentId}/spans", params), {
        method: "POST",
        body,
        headers: { "content-type": "application/json" },
        keepalive: true,
      }).catch(() => undefined);
    };
    window.addEventListener("pagehide", leave);
    return () => {
      clearInterval(timer);
      window.removeEventListener("pagehide", leave);
      leave();
    };
  }, [params, recorder, recordingId, rate, send]);
  return send;
}
