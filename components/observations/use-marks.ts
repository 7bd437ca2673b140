"use client";

import { useCallback, useRef, useState } from "react";
import { api, ApiProblem } from "@/components/api/client";
import type { CriterionMark } from "@/lib/core/tasks/types";
import type { JudgedReading } from "@/lib/core/tasks/judge-reading";

export type SheetMark = CriterionMark & { judged: JudgedReading | null };
export type KeptState = { kind: "kept" } | { kind: "sending" } | { kind: "waiting"; message: string };

type Params = { org: string; observationId: string };

const emptyMark = (key: string): SheetMark => ({ key, mark: null, reading: null, prompts: 0, remark: "", judged: null });
const RETRY_MS = 4000;

/**
 * The sheet's marks: shown at once, sent one after the other, tried again while the connection is down. The server's word on a reading
 * replaces what was shown.
 */
export function useMarks(params: Params, first: SheetMark[]) {
  const [marks, setMarks] = useState<ReadonlyMap<string, SheetMark>>(() => new Map(first.map((mark) => [mark.key, mark])));
  const [kept, setKept] = useState<KeptState>({ kind: "kept" });
  const [refusals, setRefusals] = useState<ReadonlyMap<string, string>>(new Map());
  const latest = useRef(marks);
  const waiting = useRef<string[]>([]);
  const running = useRef(false);

  const put = useCallback((mark: SheetMark) => {
    const next = new Map(latest.current).set(mark.key, mark);
    latest.current = next;
    setMarks(next);
  }, []);
  const refuse = useCallback((key: string, message: string | null) => {
    setRefusals((before) => {
      const next = new Map(before);
      if (message === null) next.delete(key);
      else next.set(key, message);
      return next;
    });
  }, []);

  const drain = useCallback(async () => {
    if (running.current) return;
    running.current = true;
    setKept({ kind: "sending" });
    while (waiting.current.length > 0) {
      const key = waiting.current[0] ?? "";
      const mark = latest.current.get(key) ?? emptyMark(key);
      const result = await sendMark(params, mark);
      if (result.kind === "offline") {
        setKept({ kind: "waiting", message: result.message });
        await new Promise((resolve) => setTimeout(resolve, RETRY_MS));
        continue;
      }
      waiting.current.shift();
      if (result.kind === "refused") {
        refuse(key, result.message);
        put({ ...(latest.current.get(key) ?? mark), mark: null });
        continue;
      }
      refuse(key, null);
      const now = latest.current.get(key) ?? mark;
      const mustBeNotYet = result.judged !== null && !result.judged.canBeMet && now.mark === null;
      put({ ...now, judged: result.judged, ...(mustBeNotYet ? { mark: "not_yet" as const } : {}) });
      if (mustBeNotYet) waiting.current.push(key);
    }
    running.current = false;
    setKept({ kind: "kept" });
  }, [params, put, refuse]);

  const change = useCallback(
    (key: string, patch: Partial<Omit<SheetMark, "key" | "judged">>) => {
      const before = latest.current.get(key) ?? emptyMark(key);
      put({ ...before, ...patch, judged: "reading" in patch ? null : before.judged });
      if (!waiting.current.slice(running.current ? 1 : 0).includes(key)) waiting.current.push(key);
      void drain();
    },
    [drain, put],
  );
  return { marks, kept, refusals, change, markOf: (key: string) => marks.get(key) ?? emptyMark(key) };
}

type Sent = { kind: "kept"; judged: JudgedReading | null } | { kind: "refused"; message: string } | { kind: "offline"; message: string };

async function sendMark(params: Params, { key, mark, reading, prompts, remark }: SheetMark): Promise<Sent> {
  try {
    const body = {
      mark,
      reading: reading && { value: reading.value, unit: reading.unit, instrumentId: reading.instrumentId },
      prompts,
      remark,
    };
    const { judged } = await api("PUT /orgs/{org}/observations/{observationId}/marks/{criterionKey}", { params: { ...params, criterionKey: key }, body });
    return { kind: "kept", judged };
  } catch (error) {
    if (error instanceof ApiProblem && error.status >= 400 && error.status < 500) return { kind: "refused", message: error.message };
    return { kind: "offline", message: error instanceof Error ? error.message : "The connection is down." };
  }
}
