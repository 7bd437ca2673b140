"use client";

import { useState } from "react";
import { api, ApiProblem } from "@/components/api/client";
import { usePress } from "@/components/api/use-press";
import { Button } from "@/components/ui/button";
import { Radio } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";

type PublishPanelProps = { params: { org: string; moduleId: string }; version: number; problems: string[]; changed: boolean; published: boolean };

/** What stands in the way, and then the press that freezes the draft. A later revision says whether the work changed. */
export function PublishPanel({ params, version, problems, changed, published }: PublishPanelProps) {
  const [workChanged, setWorkChanged] = useState<boolean | null>(published ? null : false);
  const publish = usePress(() =>
    api("POST /orgs/{org}/modules/{moduleId}/revisions", { params, body: { version, workChanged: workChanged ?? false } }),
  );
  if (problems.length > 0) {
    return (
      <div>
        <p>Before it can be published:</p>
        <ul className="mt-1 list-disc pl-5">
          {problems.map((problem) => (
            <li key={problem}>{problem}</li>
          ))}
        </ul>
      </div>
    );
  }
  if (!changed) return <p className="text-ink2">The newest revision is just as the draft is.</p>;
  return (
    <div className="grid justify-items-start gap-3">
      {publish.error && (
        <Notice kind="error" title={publish.error.message}>
          {publish.error instanceof ApiProblem && publish.error.problems.map((problem) => <p key={problem.message}>{problem.message}</p>)}
        </Notice>
      )}
      {published && (
        <fieldset className="grid gap-2">
          <legend className="text-[1.1rem]">Did the work change?</legend>
          <Radio name="work" label="No, only words or pictures. Sign-offs stay current." checked={workChanged === false} onChange={() => setWorkChanged(false)} />
          <Radio name="work" label="Yes. Sign-offs on its tasks fall due for a re-check." checked={workChanged === true} onChange={() => setWorkChanged(true)} />
        </fieldset>
      )}
      <Button kind="main" onClick={() => publish.mutate(undefined)} disabled={publish.isPending || workChanged === null}>
        Publish
      </Button>
      <p className="text-sm text-ink2">Publishing freezes it. A change makes a new revision.</p>
    </div>
  );
}
