"use client";

import { useRouter } from "next/navigation";
import { useRef, useState } from "react";
import { api } from "@/components/api/client";
import { usePress } from "@/components/api/use-press";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { formatBytes } from "@/components/upload/format-bytes";
import { addUploads } from "@/components/upload/running-uploads";
import { useRunningUploads } from "@/components/upload/use-running-uploads";
import type { UploadView } from "@/lib/schemas/uploads";

type Unfinished = Pick<UploadView, "uploadId" | "fileName" | "sizeBytes" | "modifiedMs">;

/** Films that stopped on their way: a browser can't open a file again by itself, so it has to be picked once more. */
export function UnfinishedUploads({ org, uploads }: { org: string; uploads: readonly Unfinished[] }) {
  const running = useRunningUploads(org);
  const left = uploads.filter((upload) => !running.some((each) => each.state?.uploadId === upload.uploadId || isSame(each.file, upload)));
  if (left.length === 0) return null;
  return (
    <ul className="grid gap-3">
      {left.map((upload) => (
        <UnfinishedUpload key={upload.uploadId} org={org} upload={upload} />
      ))}
    </ul>
  );
}

const isSame = (file: File, upload: Unfinished): boolean =>
  file.name === upload.fileName && file.size === upload.sizeBytes && Math.floor(file.lastModified) === upload.modifiedMs;

function UnfinishedUpload({ org, upload }: { org: string; upload: Unfinished }) {
  const picker = useRef<HTMLInputElement>(null);
  const router = useRouter();
  const [isOther, setIsOther] = useState(false);
  const giveUp = usePress(() => api("DELETE /orgs/{org}/uploads/{uploadId}", { params: { org, uploadId: upload.uploadId } }));
  return (
    <li className="flex flex-wrap items-center gap-x-4 gap-y-2 rounded border border-rule border-l-[6px] border-l-steel bg-chalk px-4 py-3">
      <div className="min-w-0 flex-1 basis-72">
        <p className="break-words font-semibold">{upload.fileName} did not arrive whole</p>
        <p className="text-ink2">{formatBytes(upload.sizeBytes)}. Pick the same file again; what has arrived is kept.</p>
        {isOther && <Notice kind="error" title="That is another file, or it was changed since. Pick the one with this name, size and date." />}
        {giveUp.error && <Notice kind="error" title={giveUp.error.message} />}
      </div>
      <Button onClick={() => picker.current?.click()}>Pick it again</Button>
      <Button kind="quiet" disabled={giveUp.isPending} onClick={() => giveUp.mutate(undefined)}>
        Give up<span className="sr-only"> {upload.fileName}</span>
      </Button>
      <input
        ref={picker}
        type="file"
        hidden
        aria-label={`${upload.fileName} again`}
        onChange={(event) => {
          const [file] = event.target.files ?? [];
          event.target.value = "";
          if (!file) return;
          setIsOther(!isSame(file, upload));
          if (!isSame(file, upload)) return;
          addUploads(org, [file]);
          router.refresh();
        }}
      />
    </li>
  );
}
