"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { api } from "@/components/api/client";
import { usePress } from "@/components/api/use-press";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { Notice } from "@/components/ui/notice";

/** Puts a recording away that no module is made of; asks once. */
export function PutAway({ org, recordingId }: { org: string; recordingId: string }) {
  const [isOpen, setIsOpen] = useState(false);
  const router = useRouter();
  const putAway = usePress(
    () => api("DELETE /orgs/{org}/recordings/{recordingId}", { params: { org, recordingId } }),
    () => router.push(`/o/${org}/recordings`),
  );
  return (
    <>
      <Button kind="quiet" className="-ml-4" onClick={() => setIsOpen(true)}>
        Put away
      </Button>
      <Dialog open={isOpen} onClose={() => setIsOpen(false)} title="Put this recording away?">
        <div className="grid gap-4">
          <p>It is no longer listed, and its steps can’t be used. The film itself stays in the store.</p>
          {putAway.error && <Notice kind="error" title={putAway.error.message} />}
          <div className="flex flex-wrap gap-3">
            <Button kind="main" disabled={putAway.isPending} onClick={() => putAway.mutate(undefined)}>
              Put it away
            </Button>
            <Button onClick={() => setIsOpen(false)}>Keep it</Button>
          </div>
        </div>
      </Dialog>
    </>
  );
}
