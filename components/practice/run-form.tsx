"use client";

import { useState } from "react";
import { api, ApiProblem } from "@/components/api/client";
import { usePress } from "@/components/api/use-press";
import { Button } from "@/components/ui/button";
import { TextArea, TextField } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";
import type { PracticeRunInput } from "@/lib/schemas/tasks";

type RunFormProps = { params: { org: string; taskId: string }; today: string };

/** A practice run in under a minute: day, vehicle, minutes. */
export function RunForm({ params, today }: RunFormProps) {
  const [open, setOpen] = useState(false);
  // One key for each form that is filled in: the same press sent twice is one run.
  const [key, setKey] = useState(() => crypto.randomUUID());
  const log = usePress(
    (body: PracticeRunInput) => api("POST /orgs/{org}/tasks/{taskId}/practice-runs", { params, body }),
    () => {
      setOpen(false);
      setKey(crypto.randomUUID());
    },
  );
  if (!open) return <Button onClick={() => setOpen(true)}>Log a practice run</Button>;
  const errorOf = (path: string) => (log.error instanceof ApiProblem ? log.error.problems.find((problem) => problem.path === path)?.message : undefined);
  return (
    <form
      className="grid gap-3 sm:grid-cols-2"
      onSubmit={(event) => {
        event.preventDefault();
        const data = new FormData(event.currentTarget);
        const text = (name: string) => String(data.get(name) ?? "");
        log.mutate({
          doneOn: text("doneOn"),
          vehicle: text("vehicle"),
          jobCardNumber: text("jobCardNumber"),
          minutes: Number(text("minutes")),
          note: text("note"),
          idempotencyKey: key,
        });
      }}
    >
      {log.error && (
        <div className="sm:col-span-2">
          <Notice kind="error" title={log.error.message} />
        </div>
      )}
      <TextField label="Day" name="doneOn" type="date" defaultValue={today} max={today} required error={errorOf("doneOn")} />
      <TextField label="Minutes" name="minutes" type="number" inputMode="numeric" min={1} max={1440} required error={errorOf("minutes")} />
      <TextField label="Vehicle" name="vehicle" maxLength={120} required error={errorOf("vehicle")} />
      <TextField label="Job card" name="jobCardNumber" maxLength={40} hint="If there is one" error={errorOf("jobCardNumber")} />
      <TextArea label="What was hard?" name="note" maxLength={1000} rows={2} className="sm:col-span-2" />
      <div className="flex gap-3 sm:col-span-2">
        <Button kind="main" type="submit" disabled={log.isPending}>
          Keep this run
        </Button>
        <Button onClick={() => setOpen(false)}>Not now</Button>
      </div>
    </form>
  );
}
