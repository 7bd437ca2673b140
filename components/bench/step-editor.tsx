"use client";

import { useEffect, useRef } from "react";
import { NAMELESS, type BenchAct } from "@/components/bench/bench-state";
import { FactsEditor } from "@/components/bench/facts-editor";
import { TimeField } from "@/components/bench/time-field";
import { Button } from "@/components/ui/button";
import { TextField } from "@/components/ui/field";
import { KeyCap } from "@/components/ui/tag";
import type { Step } from "@/lib/core/steps/types";

type StepEditorProps = { step: Step; isLast: boolean; atMs: number; durationMs: number; act: (act: BenchAct) => void; onRemove: () => void };

/** Name, edges and facts of the chosen step. Edges move by the film's place or by typing, so no dragging is needed. */
export function StepEditor({ step, isLast, atMs, durationMs, act, onRemove }: StepEditorProps) {
  const change = (patch: Partial<Step>) => act({ do: "change_step", step: { ...step, ...patch } });
  const name = useRef<HTMLDivElement>(null);
  // A step that was just set waits for its name.
  useEffect(() => {
    if (step.title === NAMELESS) name.current?.querySelector("input")?.select();
    // Once, when the step comes into view.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, []);
  return (
    <div className="grid gap-4">
      <div ref={name}>
        <TextField label="Name" value={step.title} maxLength={200} onChange={(event) => change({ title: event.target.value })} error={step.title.trim() === "" ? "Name the step." : undefined} />
      </div>
      <div className="grid grid-cols-2 gap-x-2 gap-y-3">
        <TimeField label="Begins" ms={step.startMs} onChange={(ms) => act({ do: "set_start", stepId: step.id, atMs: ms })} />
        <TimeField label="Ends" ms={step.endMs} onChange={(ms) => act({ do: "set_end", stepId: step.id, atMs: ms, durationMs })} />
        <Button onClick={() => act({ do: "set_start", stepId: step.id, atMs })}>
          <KeyCap>I</KeyCap> Begins here
        </Button>
        <Button onClick={() => act({ do: "set_end", stepId: step.id, atMs, durationMs })}>
          <KeyCap>O</KeyCap> Ends here
        </Button>
        <Button onClick={() => act({ do: "join", stepId: step.id })} disabled={isLast}>
          <KeyCap>M</KeyCap> Join with next
        </Button>
        <Button onClick={onRemove}>
          <KeyCap>Del</KeyCap> Remove
        </Button>
      </div>
      <FactsEditor facts={step.facts} onChange={(facts) => change({ facts })} />
    </div>
  );
}
