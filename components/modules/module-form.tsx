"use client";

import { useState } from "react";
import { api } from "@/components/api/client";
import { usePress } from "@/components/api/use-press";
import { StepChooser, type ChoosableStep } from "@/components/modules/step-chooser";
import { Button } from "@/components/ui/button";
import { Checkbox, TextArea, TextField } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";

type ModuleFormProps = {
  params: { org: string; moduleId: string };
  draft: { version: number; title: string; summary: string; passShare: number; stepIds: string[]; taskIds: string[] };
  availableSteps: ChoosableStep[];
  tasks: { id: string; title: string }[];
};

/** The draft: title, steps in their order, what must be known, and the tasks that it opens. Saved as a whole. */
export function ModuleForm({ params, draft, availableSteps, tasks }: ModuleFormProps) {
  const [form, setForm] = useState(draft);
  const patch = (change: Partial<typeof form>) => setForm((before) => ({ ...before, ...change }));
  const save = usePress(
    () => api("PUT /orgs/{org}/modules/{moduleId}", { params, body: form }),
    ({ version }) => patch({ version }),
  );
  const changed = JSON.stringify({ ...form, version: 0 }) !== JSON.stringify({ ...draft, version: 0 });
  return (
    <form
      className="grid gap-5"
      onSubmit={(event) => {
        event.preventDefault();
        save.mutate(undefined);
      }}
    >
      {save.error && <Notice kind="error" title={save.error.message} />}
      <TextField label="Title" value={form.title} onChange={(event) => patch({ title: event.target.value })} required maxLength={200} />
      <TextArea label="In a few words" value={form.summary} onChange={(event) => patch({ summary: event.target.value })} maxLength={2000} />
      <StepChooser available={availableSteps} chosen={form.stepIds} onChange={(stepIds) => patch({ stepIds })} />
      <TextField
        label="Share of questions that must be right, in %"
        type="number"
        inputMode="numeric"
        min={0}
        max={100}
        value={Math.round(form.passShare * 100)}
        onChange={(event) => patch({ passShare: Math.min(100, Math.max(0, Number(event.target.value))) / 100 })}
        hint="Safety-critical questions must always be right, and every step seen."
      />
      <fieldset>
        <legend className="text-[1.1rem]">Tasks that it opens</legend>
        {tasks.map((task) => (
          <Checkbox
            key={task.id}
            label={task.title}
            checked={form.taskIds.includes(task.id)}
            onChange={(event) => patch({ taskIds: event.target.checked ? [...form.taskIds, task.id] : form.taskIds.filter((id) => id !== task.id) })}
          />
        ))}
        {tasks.length === 0 && <p className="text-ink2">No task is published yet.</p>}
      </fieldset>
      <div className="flex items-center gap-4">
        <Button type="submit" kind={changed ? "main" : "plain"} disabled={save.isPending || !changed}>
          Save the draft
        </Button>
        <span role="status" className="text-ink2">
          {save.isPending ? "being saved" : changed ? "not saved yet" : "saved"}
        </span>
      </div>
    </form>
  );
}
