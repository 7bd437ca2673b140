"use client";

import { useState } from "react";
import { api } from "@/components/api/client";
import { usePress } from "@/components/api/use-press";
import { sendFile } from "@/components/upload/uploader";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { Progress } from "@/components/ui/progress";

type EvidencePhotosProps = { params: { org: string; taskId: string }; photos: { id: string; note: string; url: string }[] };

/** Photos of one's own work: taken on the spot or chosen, sent straight to the store, checked by the server. */
export function EvidencePhotos({ params, photos }: EvidencePhotosProps) {
  const [percent, setPercent] = useState<number | null>(null);
  const add = usePress(
    async (file: File) => {
      setPercent(0);
      const upload = await sendFile(file, {
        org: params.org,
        purpose: "evidence",
        signal: new AbortController().signal,
        onState: (state) => setPercent(state.totalBytes === 0 ? 0 : (100 * state.sentBytes) / state.totalBytes),
      });
      if (!upload.fileId) throw new Error("The photo did not arrive. Add it again.");
      return api("POST /orgs/{org}/tasks/{taskId}/evidence", { params, body: { fileId: upload.fileId, note: "" } });
    },
    () => setPercent(null),
  );
  const remove = usePress((evidenceId: string) => api("DELETE /orgs/{org}/evidence/{evidenceId}", { params: { org: params.org, evidenceId } }));
  const problem = add.error ?? remove.error;
  return (
    <div className="grid gap-3">
      {problem && <Notice kind="error" title={problem.message} />}
      {photos.length > 0 && (
        <ul className="grid grid-cols-2 gap-3 sm:grid-cols-3">
          {photos.map((photo, index) => (
            <li key={photo.id} className="grid gap-1">
              {/* eslint-disable-next-line @next/next/no-img-element -- a signed address of the store; the framework's optimiser must not fetch it */}
              <img src={photo.url} alt={photo.note || `Photo ${index + 1} of your work`} className="aspect-square w-full rounded border border-rule object-cover" />
              <button type="button" className="min-h-11 text-left underline underline-offset-4" onClick={() => remove.mutate(photo.id)} disabled={remove.isPending} aria-label={`Take photo ${index + 1} away`}>
                Take away
              </button>
            </li>
          ))}
        </ul>
      )}
      {add.isPending && percent !== null && <Progress label="Sending the photo" percent={percent} />}
      <AddPhoto disabled={add.isPending} onChoose={(file) => add.mutate(file)} />
    </div>
  );
}

function AddPhoto({ disabled, onChoose }: { disabled: boolean; onChoose: (file: File) => void }) {
  const [input, setInput] = useState<HTMLInputElement | null>(null);
  return (
    <>
      <input
        ref={setInput}
        type="file"
        accept="image/jpeg,image/png,image/webp"
        className="sr-only"
        tabIndex={-1}
        aria-label="Photo of your work"
        onChange={(event) => {
          const file = event.target.files?.[0];
          if (file) onChoose(file);
          event.target.value = "";
        }}
      />
      <Button className="justify-self-start" disabled={disabled} onClick={() => input?.click()}>
        Add a photo
      </Button>
    </>
  );
}
