"use client";

import { useCallback, useEffect, useRef, useState } from "react";
import { api, ApiProblem } from "@/components/api/client";
import type { Draft } from "@/components/bench/bench-state";
import type { FieldProblem } from "@/lib/core/errors";

export type SavingState =
  | { kind: "saved"; at: number | null }
  | { kind: "saving" }
  | { kind: "offline" }
  | { kind: "refused"; problems: FieldProblem[]; message: string }
  | { kind: "conflict" };

type Params = { org: string; recordingId: string };

/** Long enough to gather a few presses, short enough that hardly anything hangs on it. */
const SETTLE_MS = 1200;
const RETRY_MS = 5000;

const copyKey = (recordingId: string): string => `bench ${recordingId}`;

/** Keeps a copy on this device until the server has it. */
export function readCopy(recordingId: string): { draft: Draft; version: number } | null {
  try {
    const text = localStorage.getItem(copyKey(recordingId));
    return text ? (JSON.parse(text) as { draft: Draft; version: number }) : null;
  } catch {
    return null;
  }
}

/** Saves the draft by itself: to this device at once, to the server a moment after the last change. */
export function useSaving(params: Params, draft: Draft, firstVersion: number) {
  const [state, setState] = useState<SavingState>({ kind: "saved", at: null });
  const version = useRef(firstVersion);
  const saved = useRef(draft);
  const latest = useRef(draft);
  const busy = useRef(false);
  const stopped = useRef(false);
  const again = useRef<() => void>(() => undefined);

  const send = useCallback(async () => {
    if (busy.current || stopped.current || latest.current === saved.current) return;
    busy.current = true;
    const sending = latest.current;
    setState({ kind: "saving" });
    try {
      const answer = await api("PUT /orgs/{org}/recordings/{recordingId}/marking", { params, body: { version: version.current, ...sending } });
      version.current = answer.version;
      saved.current = sending;
      localStorage.removeItem(copyKey(params.recordingId));
      setState({ kind: "saved", at: Date.now() });
    } catch (error) {
      if (error instanceof ApiProblem && error.status === 409) {
        stopped.current = true;
        setState({ kind: "conflict" });
      } else if (error instanceof ApiProblem && error.status >= 400 && error.status < 500) {
        // Tried again with the next change: the same draft would only be refused again.
        saved.current = sending;
        setState({ kind: "refused", problems: error.problems, message: error.message });
      } else {
        setState({ kind: "offline" });
        setTimeout(() => again.current(), RETRY_MS);
      }
    } finally {
      busy.current = false;
      if (latest.current !== sending && !stopped.current) again.current();
    }
  }, [params]);

  useEffect(() => {
    again.current = () => void send();
  }, [send]);

  useEffect(() => {
    latest.current = draft;
    if (draft === saved.current || stopped.current) return;
    try {
      localStorage.setItem(copyKey(params.recordingId), JSON.stringify({ draft, version: version.current }));
    } catch {
      // A device without room keeps no copy; the server still gets it.
    }
    const timer = setTimeout(() => void send(), SETTLE_MS);
    return () => clearTimeout(timer);
  }, [draft, params.recordingId, send]);

  /** Goes on from what the server has: after a conflict, or an import. */
  const settle = useCallback(
    (theirs: Draft, theirVersion: number) => {
      version.current = theirVersion;
      saved.current = theirs;
      stopped.current = false;
      localStorage.removeItem(copyKey(params.recordingId));
      setState({ kind: "saved", at: Date.now() });
    },
    [params.recordingId],
  );
  return { state, settle, version: () => version.current };
}
