"use client";

import type { BenchAct } from "@/components/bench/bench-state";
import { FactsEditor } from "@/components/bench/facts-editor";
import { Button } from "@/components/ui/button";
import { TextField } from "@/components/ui/field";
import { KeyCap, Value } from "@/components/ui/tag";
import type { Step } from "@/lib/core/steps/types";
import { formatTimestamp } from "@/lib/core/webvtt/timestamps";

type StepEditorProps = { step: Step; number: number; atMs: number; durationMs: number; act: (act: BenchAct) => void };

/** Name, edges and facts of the chosen step. Edges move by the film's place, so no dragging is needed. */
export function StepEditor({ step, number, atMs, durationMs, act }: StepEditorProps) {
  return (
    <div className="grid gap-4">
      <h2 className="text-[1.4rem] leading-tight">Step {number}</h2>
      <TextField label="Name" value={step.title} maxLength={200} placeholder="What is done" onChange={(event) => act({ do: "change_step", step: { ...step, title: event.target.value } })} />
      <p>
        <Value>{formatTimestamp(step.startMs)}</Value> – <Value>{formatTimestamp(step.endMs)}</Value>
      </p>
      <div className="flex flex-wrap gap-2">
        <Button onClick={() => act({ do: "set_start", stepId: step.id, atMs })}>
          <KeyCap>I</KeyCap> Begins here
        </Button>
        <Button onClick={() => act({ do: "set_end", stepId: step.id, atMs, durationMs })}>
          <KeyCap>O</KeyCap> Ends here
        </Button>
        <Button onClick={() => act({ do: "join", stepId: step.id })}>
          <KeyCap>M</KeyCap> Join with the next
        </Button>
        <Button kind="quiet" onClick={() => act({ do: "remove_step", stepId: step.id })}>
          Remove this step
        </Button>
      </div>
      <FactsEditor facts={step.facts} onChange={(facts) => act({ do: "change_step", step: { ...step, facts } })} />
    </div>
  );
}
