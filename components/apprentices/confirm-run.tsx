"use client";

import { api } from "@/components/api/client";
import { usePress } from "@/components/api/use-press";
import { Button } from "@/components/ui/button";

/** One press: I saw this run. It is not a sign-off. */
export function ConfirmRun({ params, label }: { params: { org: string; practiceRunId: string }; label: string }) {
  const confirm = usePress(() => api("POST /orgs/{org}/practice-runs/{practiceRunId}/confirmation", { params }));
  return (
    <span className="grid gap-1">
      <Button onClick={() => confirm.mutate(undefined)} disabled={confirm.isPending} aria-label={label}>
        I saw it
      </Button>
      {confirm.error && (
        <span role="alert" className="text-sm font-semibold text-paint-text">
          {confirm.error.message}
        </span>
      )}
    </span>
  );
}
