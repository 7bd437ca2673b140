"use client";

import { useCallback, useEffect, useMemo, useRef, useState } from "react";
import { api, ApiProblem } from "@/components/api/client";
import type { Draft } from "@/components/bench/bench-state";
import { keepable, type Unfinished } from "@/components/bench/keepable";
import { dropCopy, readCopy, writeCopy, type CopyPlace, type LocalCopy } from "@/components/bench/local-copy";
import type { FieldProblem } from "@/lib/core/errors";
import type { MarkingView } from "@/lib/schemas/marking";

export type SavingState =
  | { kind: "saved"; at: number | null }
  | { kind: "saving" }
  | { kind: "offline" }
  | { kind: "refused"; problems: FieldProblem[]; message: string }
  /** Somebody else saved on top of what this began from; nothing is sent until it is decided which goes on. */
  | { kind: "conflict"; theirs: MarkingView };

/** Something of this device's that is not on the bench: it can be taken back. */
export type SetAside = { copy: LocalCopy; why: CopyPlace };

/** Long enough to gather a few presses, short enough that hardly anything hangs on it. */
const SETTLE_MS = 1200;
const RETRY_MS = 5000;

type Params = { org: string; recordingId: string };
type Saving = { params: Params; draft: Draft; first: MarkingView; load: (draft: Draft) => void };

/** Saves the draft by itself: to this device at once, to the server a moment after the last change. */
export function useSaving({ params, draft, first, load }: Saving) {
  const { org, recordingId } = params;
  const [state, setState] = useState<SavingState>({ kind: "saved", at: first.savedAt ? Date.parse(first.savedAt) : null });
  const [aside, setAside] = useState<SetAside | null>(null);
  const version = useRef(first.version);
  /** The last draft that was dealt with, and what the server has. */
  const dealt = useRef(draft);
  const kept = useRef<Draft>(draft);
  const latest = useRef(draft);
  const busy = useRef(false);
  const stopped = useRef(false);
  const [keptNow, setKeptNow] = useState<Draft>(draft);
  const unfinished: Unfinished[] = useMemo(() => keepable(draft, keptNow).unfinished, [draft, keptNow]);

  const send = useCallback(async () => {
    if (busy.current || stopped.current || latest.current === dealt.current) return;
    busy.current = true;
    const sending = latest.current;
    const whole = keepable(sending, kept.current);
    let retryInMs: number | null = 0;
    setState({ kind: "saving" });
    try {
      const answer = await api("PUT /orgs/{org}/recordings/{recordingId}/marking", { params: { org, recordingId }, body: { version: version.current, ...whole.draft } });
      version.current = answer.version;
      kept.current = whole.draft;
      dealt.current = sending;
      setKeptNow(whole.draft);
      if (whole.unfinished.length === 0 && latest.current === sending) dropCopy(recordingId, "unsaved");
      else writeCopy(recordingId, "unsaved", { draft: latest.current, version: answer.version });
      setState({ kind: "saved", at: Date.now() });
    } catch (error) {
      const status = error instanceof ApiProblem ? error.status : 0;
      retryInMs = RETRY_MS;
      if (status === 409) {
        stopped.current = true;
        const theirs = await api("GET /orgs/{org}/recordings/{recordingId}/marking", { params: { org, recordingId } }).catch(() => null);
        stopped.current = theirs !== null;
        setState(theirs ? { kind: "conflict", theirs } : { kind: "offline" });
      } else if (error instanceof ApiProblem && status >= 400 && status < 500) {
        // Tried again with the next change: the same draft would only be refused again.
        dealt.current = sending;
        retryInMs = 0;
        setState({ kind: "refused", problems: error.problems, message: error.message });
      } else setState({ kind: "offline" });
    } finally {
      busy.current = false;
      if (latest.current !== dealt.current && !stopped.current) setTimeout(() => again.current(), retryInMs ?? 0);
    }
  }, [org, recordingId]);
  const again = useRef<() => void>(() => undefined);
  useEffect(() => {
    again.current = () => void send();
  }, [send]);

  useEffect(() => {
    latest.current = draft;
    if (draft === dealt.current) return;
    writeCopy(recordingId, "unsaved", { draft, version: version.current });
    if (stopped.current) return;
    const timer = setTimeout(() => void send(), SETTLE_MS);
    return () => clearTimeout(timer);
  }, [draft, recordingId, send]);

  // A page that is left, or comes back to the net, doesn't wait.
  useEffect(() => {
    const now = () => void send();
    window.addEventListener("online", now);
    document.addEventListener("visibilitychange", now);
    return () => {
      window.removeEventListener("online", now);
      document.removeEventListener("visibilitychange", now);
      now();
    };
  }, [send]);

  // What this device had kept goes on by itself where nobody saved since; otherwise it waits to be taken or dropped.
  useEffect(() => {
    const timer = setTimeout(() => {
      const [unsaved, replaced] = [readCopy(recordingId, "unsaved"), readCopy(recordingId, "replaced")];
      if (unsaved?.version === first.version) load(unsaved.draft);
      if (unsaved && unsaved.version !== first.version) setAside({ copy: unsaved, why: "unsaved" });
      else if (replaced) setAside({ copy: replaced, why: "replaced" });
    });
    return () => clearTimeout(timer);
  }, [first.version, load, recordingId]);

  /** Goes on from what the server has: after a conflict, or an import. */
  const settle = useCallback(
    (theirs: MarkingView) => {
      const next = { steps: theirs.steps, questions: theirs.questions };
      version.current = theirs.version;
      dealt.current = kept.current = latest.current = next;
      stopped.current = false;
      setKeptNow(next);
      dropCopy(recordingId, "unsaved");
      load(next);
      setState({ kind: "saved", at: theirs.savedAt ? Date.parse(theirs.savedAt) : null });
    },
    [load, recordingId],
  );
  const dropAside = () => {
    if (aside) dropCopy(recordingId, aside.why);
    setAside(null);
  };
  return {
    state,
    unfinished,
    aside,
    version: () => version.current,
    settle,
    /** Theirs comes on the bench; mine is laid aside on this device. */
    loadTheirs: (theirs: MarkingView) => {
      const copy = { draft: latest.current, version: theirs.version };
      writeCopy(recordingId, "replaced", copy);
      setAside({ copy, why: "replaced" });
      settle(theirs);
    },
    /** Mine goes on top of theirs. */
    keepMine: (theirs: MarkingView) => {
      version.current = theirs.version;
      kept.current = { steps: theirs.steps, questions: theirs.questions };
      stopped.current = false;
      void send();
    },
    takeAside: () => {
      if (aside) load(aside.copy.draft);
      dropAside();
    },
    dropAside,
  };
}
