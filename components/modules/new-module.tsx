"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { api } from "@/components/api/client";
import { usePress } from "@/components/api/use-press";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { SelectField, TextField } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";

type NewModuleProps = { org: string; recordings: { id: string; title: string; steps: number }[] };

/** Begins a module from a recording that is marked out, which is how most begin. */
export function NewModule({ org, recordings }: NewModuleProps) {
  const router = useRouter();
  const [open, setOpen] = useState(false);
  const [recordingId, setRecordingId] = useState(recordings[0]?.id ?? "");
  const [title, setTitle] = useState(recordings[0]?.title ?? "");
  const begin = usePress(
    () => api("POST /orgs/{org}/modules", { params: { org }, body: { title, recordingId: recordingId || null } }),
    ({ moduleId }) => router.push(`/o/${org}/modules/${moduleId}`),
  );
  return (
    <>
      <Button kind="main" onClick={() => setOpen(true)}>
        New module
      </Button>
      <Dialog open={open} onClose={() => setOpen(false)} title="New module">
        <form
          className="grid gap-4"
          onSubmit={(event) => {
            event.preventDefault();
            begin.mutate(undefined);
          }}
        >
          {begin.error && <Notice kind="error" title={begin.error.message} />}
          <SelectField
            label="From the steps of"
            value={recordingId}
            onChange={(event) => {
              setRecordingId(event.target.value);
              setTitle(recordings.find((recording) => recording.id === event.target.value)?.title ?? title);
            }}
          >
            {recordings.map((recording) => (
              <option key={recording.id} value={recording.id}>
                {recording.title} ({recording.steps} steps)
              </option>
            ))}
            <option value="">no recording, steps are added later</option>
          </SelectField>
          <TextField label="Title" value={title} onChange={(event) => setTitle(event.target.value)} required maxLength={200} />
          <Button kind="main" type="submit" disabled={begin.isPending}>
            Begin
          </Button>
        </form>
      </Dialog>
    </>
  );
}
