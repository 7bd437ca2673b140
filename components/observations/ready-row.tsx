"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { api } from "@/components/api/client";
import { usePress } from "@/components/api/use-press";
import { Bolt } from "@/components/bolt/bolt";
import { Button } from "@/components/ui/button";
import { TextField } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";
import { Tag } from "@/components/ui/tag";
import { formatDay } from "@/lib/core/dates";
import type { Standing } from "@/lib/core/standing/types";

type ReadyRowProps = {
  org: string;
  item: {
    readinessId: string;
    apprenticeId: string;
    apprentice: string;
    workshop: string;
    taskId: string;
    task: string;
    standing: Standing;
    waitedDays: number;
    bookedFor: string | null;
    bookedBy: string | null;
    refused: string | null;
  };
};

/** One apprentice who waits: make a date, or open the sheet at the vehicle. */
export function ReadyRow({ org, item }: ReadyRowProps) {
  const [open, setOpen] = useState<"sheet" | "date" | null>(null);
  return (
    <li className="grid gap-3 border-b border-rule px-4 py-4 last:border-b-0">
      <div className="flex flex-wrap items-center gap-x-4 gap-y-2">
        <Bolt standing={item.standing} size={44} />
        <div className="min-w-0 flex-1 basis-56">
          <p className="font-plate text-[1.3rem] font-semibold leading-tight">{item.task}</p>
          <p>
            {item.apprentice} <span className="text-ink2">{item.workshop}</span>
          </p>
        </div>
        {item.bookedFor ? (
          <Tag kind="strong">
            {formatDay(item.bookedFor.slice(0, 10))} {item.bookedFor.slice(11, 16)} · {item.bookedBy}
          </Tag>
        ) : (
          <Tag>{item.waitedDays === 0 ? "since today" : `waits ${item.waitedDays} ${item.waitedDays === 1 ? "day" : "days"}`}</Tag>
        )}
      </div>
      {item.refused && <p className="text-ink2">{item.refused}</p>}
      {!item.refused && open === null && (
        <div className="flex flex-wrap gap-3">
          <Button kind="main" onClick={() => setOpen("sheet")}>
            Open the sheet
          </Button>
          <Button onClick={() => setOpen("date")}>Make a date</Button>
        </div>
      )}
      {open === "sheet" && <OpenSheet org={org} item={item} onCancel={() => setOpen(null)} />}
      {open === "date" && <MakeDate org={org} readinessId={item.readinessId} onDone={() => setOpen(null)} />}
    </li>
  );
}

function OpenSheet({ org, item, onCancel }: ReadyRowProps & { onCancel: () => void }) {
  const router = useRouter();
  const [key] = useState(() => crypto.randomUUID());
  const start = usePress(
    (of: { vehicle: string; jobCardNumber: string }) =>
      api("POST /orgs/{org}/observations", { params: { org }, body: { ...of, apprenticeId: item.apprenticeId, taskId: item.taskId, idempotencyKey: key } }),
    ({ observationId }) => router.push(`/o/${org}/observations/${observationId}`),
  );
  return (
    <form
      className="grid gap-3 sm:grid-cols-2"
      onSubmit={(event) => {
        event.preventDefault();
        const data = new FormData(event.currentTarget);
        start.mutate({ vehicle: String(data.get("vehicle") ?? ""), jobCardNumber: String(data.get("jobCardNumber") ?? "") });
      }}
    >
      {start.error && (
        <div className="sm:col-span-2">
          <Notice kind="error" title={start.error.message} />
        </div>
      )}
      <TextField label="Vehicle" name="vehicle" required maxLength={120} autoFocus />
      <TextField label="Job card" name="jobCardNumber" required maxLength={40} />
      <div className="flex gap-3 sm:col-span-2">
        <Button kind="main" type="submit" disabled={start.isPending}>
          Begin
        </Button>
        <Button onClick={onCancel}>Not now</Button>
      </div>
    </form>
  );
}

function MakeDate({ org, readinessId, onDone }: { org: string; readinessId: string; onDone: () => void }) {
  const book = usePress(
    (startsAt: string) => api("PUT /orgs/{org}/readiness/{readinessId}/booking", { params: { org, readinessId }, body: { startsAt } }),
    onDone,
  );
  return (
    <form
      className="flex flex-wrap items-end gap-3"
      onSubmit={(event) => {
        event.preventDefault();
        const local = String(new FormData(event.currentTarget).get("at") ?? "");
        if (local) book.mutate(new Date(local).toISOString());
      }}
    >
      {book.error && <Notice kind="error" title={book.error.message} />}
      <TextField label="Day and time" name="at" type="datetime-local" required />
      <Button kind="main" type="submit" disabled={book.isPending}>
        Book
      </Button>
      <Button onClick={onDone}>Not now</Button>
    </form>
  );
}
