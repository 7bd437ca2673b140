"use client";

import { useRouter } from "next/navigation";
import { useEffect } from "react";
import { UploadLine } from "@/components/upload/upload-line";
import { useRunningUploads } from "@/components/upload/use-running-uploads";

/** What this tab is sending, on every page of the organisation; nothing while there is nothing. */
export function UploadStrip({ org }: { org: string }) {
  const uploads = useRunningUploads(org);
  const arrived = uploads.filter((upload) => upload.outcome).length;
  const router = useRouter();
  useEffect(() => {
    // The page in view may list recordings.
    if (arrived > 0) router.refresh();
  }, [arrived, router]);
  if (uploads.length === 0) return null;
  return (
    <aside aria-label="Recordings being sent" data-no-print className="border-b border-rule bg-chalk px-4 py-2 sm:px-6">
      <ul className="mx-auto grid w-full max-w-[100rem] gap-2">
        {uploads.map((upload) => (
          <UploadLine key={upload.key} upload={upload} />
        ))}
      </ul>
    </aside>
  );
}
