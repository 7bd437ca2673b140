"use client";

import { useMutation } from "@tanstack/react-query";
import { useState } from "react";
import { api } from "@/components/api/client";
import { Button } from "@/components/ui/button";
import { TextField } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";

const REASONS = ["Support or lift not safe", "Protective equipment off", "Wrong part of the vehicle", "Could hurt somebody"] as const;

type StopPanelProps = { params: { org: string; observationId: string }; onStopped: (reason: string) => void };

/** Make it safe first, then say why: one press for the usual reasons, words for others. */
export function StopPanel({ params, onStopped }: StopPanelProps) {
  const [other, setOther] = useState("");
  const stop = useMutation({
    mutationFn: (reason: string) => api("POST /orgs/{org}/observations/{observationId}/stop", { params, body: { reason } }),
    onSuccess: (_, reason) => onStopped(reason),
  });
  return (
    <div className="grid gap-3">
      <p>Make it safe first. The sheet then ends as “not yet”, with this reason.</p>
      {stop.error && <Notice kind="error" title={stop.error.message} />}
      {REASONS.map((reason) => (
        <Button key={reason} onClick={() => stop.mutate(reason)} disabled={stop.isPending} className="min-h-14">
          {reason}
        </Button>
      ))}
      <form
        className="flex items-end gap-3"
        onSubmit={(event) => {
          event.preventDefault();
          if (other.trim()) stop.mutate(other.trim());
        }}
      >
        <TextField label="Another reason" value={other} onChange={(event) => setOther(event.target.value)} maxLength={500} className="flex-1" />
        <Button type="submit" disabled={stop.isPending || !other.trim()}>
          Stop
        </Button>
      </form>
    </div>
  );
}
