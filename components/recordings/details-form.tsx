"use client";

import { useState } from "react";
import { api, ApiProblem } from "@/components/api/client";
import { usePress } from "@/components/api/use-press";
import { Button } from "@/components/ui/button";
import { Checkbox, Radio, SelectField, TextArea, TextField } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";
import { formatDay } from "@/lib/core/dates";
import type { ChangeRecordingInput, RecordingView } from "@/lib/schemas/recordings";

export type Vehicle = { id: string; label: string; model: string };
type DetailsFormProps = { org: string; recording: RecordingView; vehicles: readonly Vehicle[]; onKept: () => void };

const NEW_VEHICLE = "new";

/** What has to be known of a recording before anybody learns from it: what it shows, who agreed, and that nothing private is in it. */
export function DetailsForm({ org, recording, vehicles, onKept }: DetailsFormProps) {
  const [vehicle, setVehicle] = useState(recording.vehicleId ?? "");
  const [consent, setConsent] = useState(recording.consent);
  const keep = usePress(
    (body: ChangeRecordingInput) => api("PATCH /orgs/{org}/recordings/{recordingId}", { params: { org, recordingId: recording.recordingId }, body }),
    onKept,
  );
  const errorOf = (path: string) => (keep.error instanceof ApiProblem ? keep.error.problems.find((problem) => problem.path.startsWith(path))?.message : undefined);
  const submit = (event: React.FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    const data = new FormData(event.currentTarget);
    const text = (name: string) => String(data.get(name) ?? "");
    const isChecked = data.get("private") !== null;
    keep.mutate({
      title: text("title"),
      vehicle: vehicle === "" ? null : vehicle === NEW_VEHICLE ? { label: text("label"), model: text("model") } : { vehicleId: vehicle },
      ...(consent ? { consent } : {}),
      consentNote: text("consentNote"),
      ...(isChecked === (recording.privateDetailsCheckedAt !== null) ? {} : { privateDetailsChecked: isChecked }),
    });
  };
  return (
    <form className="grid gap-4" onSubmit={submit}>
      <TextField label="Title" name="title" defaultValue={recording.title} maxLength={200} required error={errorOf("title")} />
      <SelectField label="Vehicle" value={vehicle} onChange={(event) => setVehicle(event.target.value)} error={errorOf("vehicle")}>
        <option value="">Not said yet</option>
        {vehicles.map(({ id, label, model }) => (
          <option key={id} value={id}>
            {label}, {model}
          </option>
        ))}
        <option value={NEW_VEHICLE}>Another vehicle</option>
      </SelectField>
      {vehicle === NEW_VEHICLE && (
        <div className="grid gap-3 sm:grid-cols-2">
          <TextField label="What the workshop calls it" name="label" maxLength={80} required hint="No plate, no owner’s name" />
          <TextField label="Model" name="model" maxLength={120} required />
        </div>
      )}
      <fieldset className="grid gap-2">
        <legend className="mb-1 text-[1.1rem]">People in the picture or to be heard</legend>
        <Radio name="consent" label="Nobody but me" checked={consent === "nobody_in_shot"} onChange={() => setConsent("nobody_in_shot")} />
        <Radio name="consent" label="All of them agreed" checked={consent === "consent_given"} onChange={() => setConsent("consent_given")} />
      </fieldset>
      {consent === "consent_given" && (
        <TextArea label="Who agreed, and where that is kept" name="consentNote" rows={2} maxLength={500} defaultValue={recording.consentNote} />
      )}
      <Checkbox
        name="private"
        defaultChecked={recording.privateDetailsCheckedAt !== null}
        label="I looked for number plates, chassis numbers and customer papers, and none can be read"
        hint={checkedWords(recording)}
      />
      {keep.error && <Notice kind="error" title={keep.error.message} />}
      <div className="flex flex-wrap items-center gap-4">
        <Button type="submit" disabled={keep.isPending}>
          Keep these details
        </Button>
        {keep.isSuccess && <p role="status">Kept.</p>}
      </div>
    </form>
  );
}

function checkedWords({ privateDetailsCheckedAt, privateDetailsCheckedBy }: RecordingView): string {
  if (!privateDetailsCheckedAt) return "Asked before an apprentice sees anything of it.";
  return `${privateDetailsCheckedBy ?? ""}, ${formatDay(privateDetailsCheckedAt.slice(0, 10))}`;
}
