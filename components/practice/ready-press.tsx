"use client";

import { api } from "@/components/api/client";
import { usePress } from "@/components/api/use-press";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";

type ReadyPressProps = { params: { org: string; taskId: string }; ready: boolean; missing: string[] };

/** The one press that asks to be seen, or says what is missing before it can be pressed. */
export function ReadyPress({ params, ready, missing }: ReadyPressProps) {
  const declare = usePress(() => api("PUT /orgs/{org}/tasks/{taskId}/readiness", { params }));
  const takeBack = usePress(() => api("DELETE /orgs/{org}/tasks/{taskId}/readiness", { params }));
  const problem = declare.error ?? takeBack.error;
  return (
    <div className="grid justify-items-start gap-3">
      {problem && <Notice kind="error" title={problem.message} />}
      {ready ? (
        <Button onClick={() => takeBack.mutate(undefined)} disabled={takeBack.isPending}>
          Take “ready” back
        </Button>
      ) : (
        <>
          {missing.length > 0 && (
            <ul className="list-disc pl-5 text-ink2">
              {missing.map((line) => (
                <li key={line}>{line}</li>
              ))}
            </ul>
          )}
          <Button kind="main" onClick={() => declare.mutate(undefined)} disabled={declare.isPending || missing.length > 0}>
            I am ready to be seen
          </Button>
        </>
      )}
    </div>
  );
}
