"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { leaveFor } from "@/components/accounts/leave-for";
import { refusalOf, type Refusal } from "@/components/accounts/refusal";
import { Refused } from "@/components/accounts/refused";
import { api } from "@/components/api/client";
import { Button } from "@/components/ui/button";
import { Tag } from "@/components/ui/tag";
import { formatDay } from "@/lib/core/dates";

type Device = { id: string; device: string; since: string; lastSeen: string; here: boolean };

const HERE_NOW_MS = 5 * 60_000;

/** Every device on which the person is signed in, to sign out one or all. */
export function Devices({ devices }: { devices: readonly Device[] }) {
  const router = useRouter();
  const [busy, setBusy] = useState(false);
  const [refusal, setRefusal] = useState<Refusal | null>(null);

  async function act(send: () => Promise<unknown>, then: () => void) {
    setBusy(true);
    setRefusal(null);
    await send().then(then, (error: unknown) => setRefusal(refusalOf(error)));
    setBusy(false);
  }
  const signOutHere = (sessionId: string) =>
    act(() => api("DELETE /account/sessions/{sessionId}", { params: { sessionId } }), () => router.refresh());
  const signOutEverywhere = () => act(() => api("DELETE /account/sessions", { params: {} }), () => leaveFor("/sign-in"));

  return (
    <div className="grid gap-3">
      <Refused refusal={refusal} />
      <ul>
        {devices.map((device) => (
          <li key={device.id} className="flex min-h-14 items-center justify-between gap-x-4 border-b border-rule py-1.5">
            <span>
              <span className="font-semibold">{device.device}</span> {device.here && <Tag kind="strong">this one</Tag>}
              <span className="block text-sm text-ink2">
                since {formatDay(device.since.slice(0, 10))}, last used {lastUsed(device)}
              </span>
            </span>
            {!device.here && (
              <Button kind="quiet" className="shrink-0" disabled={busy} onClick={() => void signOutHere(device.id)} aria-label={`Sign out ${device.device}`}>
                Sign out
              </Button>
            )}
          </li>
        ))}
      </ul>
      <Button className="justify-self-start" disabled={busy} onClick={() => void signOutEverywhere()}>
        Sign out everywhere
      </Button>
    </div>
  );
}

function lastUsed(device: Device): string {
  if (device.here || Date.parse(device.lastSeen) + HERE_NOW_MS > Date.now()) return "now";
  return formatDay(device.lastSeen.slice(0, 10));
}
