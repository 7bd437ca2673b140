"use client";

import { useRef } from "react";
import { api, ApiProblem } from "@/components/api/client";
import { usePress } from "@/components/api/use-press";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";

type CaptionsFormProps = { org: string; recordingId: string; languages: readonly string[]; onTaken: () => void };

const MOST_PROBLEMS = 8;

/** Takes captions in from a file, whole or not at all, and says line by line what keeps them out. */
export function CaptionsForm({ org, recordingId, languages, onTaken }: CaptionsFormProps) {
  const picker = useRef<HTMLInputElement>(null);
  const take = usePress(
    async (file: File) => api("PUT /orgs/{org}/recordings/{recordingId}/captions", { params: { org, recordingId }, body: { text: await file.text() } }),
    onTaken,
  );
  const problems = take.error instanceof ApiProblem ? take.error.problems : [];
  return (
    <div className="grid justify-items-start gap-3">
      <p className="text-ink2">
        {languages.length > 0 ? "The film has captions; another file takes their place." : "From a WebVTT or SubRip file. Many learn in a noisy shop, or in a second language."}
      </p>
      <Button disabled={take.isPending} onClick={() => picker.current?.click()}>
        Pick a captions file
      </Button>
      <input
        ref={picker}
        type="file"
        accept=".vtt,.srt,text/vtt"
        hidden
        aria-label="Captions file"
        onChange={(event) => {
          const [file] = event.target.files ?? [];
          event.target.value = "";
          if (file) take.mutate(file);
        }}
      />
      {take.data && <p role="status">{take.data.cues} captions taken in.</p>}
      {take.error && (
        <Notice kind="error" title={take.error.message}>
          <ul>
            {problems.slice(0, MOST_PROBLEMS).map((problem, index) => (
              <li key={index}>
                <span className="font-mono">{problem.path}</span>: {problem.message}
              </li>
            ))}
            {problems.length > MOST_PROBLEMS && <li>and {problems.length - MOST_PROBLEMS} more</li>}
          </ul>
        </Notice>
      )}
    </div>
  );
}
