"use client";

import { useMutation } from "@tanstack/react-query";
import { useState } from "react";
import { api, ApiProblem, doorPath } from "@/components/api/client";
import { Button, LinkButton } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import type { MarkingView } from "@/lib/schemas/marking";

type VttPanelProps = {
  params: { org: string; recordingId: string };
  hasCaptions: boolean;
  version: () => number;
  onImported: (marking: MarkingView) => void;
};

/** Steps and questions as WebVTT files: kept, changed elsewhere, and taken back whole or not at all. */
export function VttPanel({ params, hasCaptions, version, onImported }: VttPanelProps) {
  const [files, setFiles] = useState<{ chapters: File | null; marking: File | null }>({ chapters: null, marking: null });
  const take = useMutation({
    mutationFn: async () => {
      const chapters = (await files.chapters?.text()) ?? null;
      const marking = (await files.marking?.text()) ?? null;
      return api("POST /orgs/{org}/recordings/{recordingId}/marking/imports", { params, body: { version: version(), chapters, marking } });
    },
    onSuccess: onImported,
  });
  return (
    <div className="grid gap-4">
      <div className="flex flex-wrap gap-3">
        <LinkButton download href={doorPath("GET /orgs/{org}/recordings/{recordingId}/chapters.vtt", params)}>
          Download steps
        </LinkButton>
        <LinkButton download href={doorPath("GET /orgs/{org}/recordings/{recordingId}/questions.vtt", params)}>
          Download facts and questions
        </LinkButton>
        {hasCaptions && (
          <LinkButton download href={doorPath("GET /orgs/{org}/recordings/{recordingId}/captions.vtt", params)}>
            Download captions
          </LinkButton>
        )}
      </div>
      <p className="text-ink2">
        What you take here replaces what is on the bench, whole or not at all. Steps alone keep the facts and questions of those that stay.
      </p>
      {take.error && (
        <Notice kind="error" title={take.error.message}>
          {take.error instanceof ApiProblem && (
            <ul className="max-h-60 overflow-y-auto">
              {take.error.problems.map((problem) => (
                <li key={`${problem.path} ${problem.message}`}>
                  <span className="font-semibold text-ink">{problem.path}:</span> {problem.message}
                </li>
              ))}
            </ul>
          )}
        </Notice>
      )}
      {take.isSuccess && <Notice kind="done" title="Taken. What was here before is replaced." />}
      <FileField label="Steps (chapters, .vtt)" onChoose={(chapters) => setFiles((before) => ({ ...before, chapters }))} />
      <FileField label="Facts and questions (metadata, .vtt)" onChoose={(marking) => setFiles((before) => ({ ...before, marking }))} />
      <Button kind="main" onClick={() => take.mutate()} disabled={take.isPending || (!files.chapters && !files.marking)} className="justify-self-start">
        Take these files
      </Button>
    </div>
  );
}

function FileField({ label, onChoose }: { label: string; onChoose: (file: File | null) => void }) {
  return (
    <label className="grid gap-1">
      <span className="font-plate text-[1.1rem] font-semibold">{label}</span>
      <input type="file" accept=".vtt,text/vtt" className="min-h-11 rounded border-[1.5px] border-steel bg-chalk p-2" onChange={(event) => onChoose(event.target.files?.[0] ?? null)} />
    </label>
  );
}
