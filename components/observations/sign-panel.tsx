"use client";

import { useQuery } from "@tanstack/react-query";
import { useRouter } from "next/navigation";
import { useState } from "react";
import { api } from "@/components/api/client";
import { usePress } from "@/components/api/use-press";
import { Button } from "@/components/ui/button";
import { Radio, TextArea, TextField } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";
import { LEVEL_LABEL, LEVELS, type Level } from "@/lib/core/tasks/types";
import type { SheetOutcome } from "@/lib/schemas/observations";

type Params = { org: string; observationId: string };

/** The computed outcome with its reasons, the level within what rules allow, and the signature. */
export function SignPanel({ params, apprentice }: { params: Params; apprentice: string }) {
  const outcome = useQuery({
    queryKey: ["outcome", params.observationId],
    queryFn: () => api("GET /orgs/{org}/observations/{observationId}/outcome", { params }),
    staleTime: 0,
    gcTime: 0,
  });
  if (outcome.error) return <Notice kind="error" title={outcome.error.message} />;
  if (!outcome.data) return <p role="status">Computing the outcome</p>;
  return <SignForm params={params} apprentice={apprentice} outcome={outcome.data} />;
}

function SignForm({ params, apprentice, outcome }: { params: Params; apprentice: string; outcome: SheetOutcome }) {
  const router = useRouter();
  const [level, setLevel] = useState<Level | null>(null);
  const met = outcome.outcome === "met";
  const sign = usePress(
    (of: { password: string; feedback: string }) =>
      api("POST /orgs/{org}/observations/{observationId}/sign-off", { params, body: { ...of, level: met ? level : null } }),
    ({ signOffId }) => router.push(`/o/${params.org}/sign-offs/${signOffId}?signed=now`),
  );
  return (
    <form
      className="grid gap-4"
      onSubmit={(event) => {
        event.preventDefault();
        const data = new FormData(event.currentTarget);
        sign.mutate({ password: String(data.get("password") ?? ""), feedback: String(data.get("feedback") ?? "") });
      }}
    >
      <Notice kind={met ? "done" : "info"} title={met ? "Met" : "Not yet"}>
        {outcome.reasons.length > 0 && (
          <ul className="list-disc pl-5">
            {outcome.reasons.map((reason) => (
              <li key={`${reason.key} ${reason.text}`}>{reason.text}</li>
            ))}
          </ul>
        )}
      </Notice>
      {met && <LevelChoice cap={outcome.levelCap as Level} reasons={outcome.capReasons} level={level} onChange={setLevel} />}
      <TextArea label={`To ${apprentice}, in three lines`} name="feedback" maxLength={1000} />
      {sign.error && <Notice kind="error" title={sign.error.message} />}
      <TextField label="Your password" name="password" type="password" autoComplete="current-password" required hint="Signing asks for it again. What you sign is never edited afterwards." />
      <Button kind="main" type="submit" disabled={sign.isPending || (met && level === null)}>
        {met ? "Sign off" : "Sign “not yet”"}
      </Button>
    </form>
  );
}

type LevelChoiceProps = { cap: Level; reasons: string[]; level: Level | null; onChange: (level: Level) => void };

function LevelChoice({ cap, reasons, level, onChange }: LevelChoiceProps) {
  return (
    <fieldset className="grid gap-2">
      <legend className="mb-1 text-[1.15rem]">Supervision level</legend>
      {LEVELS.map((candidate) => (
        <Radio
          key={candidate}
          name="level"
          label={
            <>
              <span className="tabular font-mono">{candidate}</span> {LEVEL_LABEL[candidate]}
            </>
          }
          disabled={candidate > cap}
          checked={level === candidate}
          onChange={() => onChange(candidate)}
        />
      ))}
      {reasons.map((reason) => (
        <p key={reason} className="text-sm text-ink2">
          {reason}
        </p>
      ))}
    </fieldset>
  );
}
