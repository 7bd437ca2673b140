"use client";

import { useState } from "react";
import { api } from "@/components/api/client";
import { usePress } from "@/components/api/use-press";
import { Button } from "@/components/ui/button";
import { Checkbox, TextField } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";

type GivePanelProps = {
  params: { org: string; moduleId: string };
  apprentices: { id: string; name: string; holds: boolean }[];
  today: string;
  inTwoWeeks: string;
};

/** Gives the newest revision to apprentices with a date; each gets a mail. */
export function GivePanel({ params, apprentices, today, inTwoWeeks }: GivePanelProps) {
  const [chosen, setChosen] = useState<string[]>([]);
  const [dueOn, setDueOn] = useState(inTwoWeeks);
  const give = usePress(
    () => api("POST /orgs/{org}/modules/{moduleId}/assignments", { params, body: { apprenticeIds: chosen, dueOn } }),
    () => setChosen([]),
  );
  return (
    <form
      className="grid gap-3"
      onSubmit={(event) => {
        event.preventDefault();
        give.mutate(undefined);
      }}
    >
      {give.error && <Notice kind="error" title={give.error.message} />}
      {give.data && <Notice kind="done" title={give.data.given === 0 ? "The date is changed." : `Given to ${give.data.given}. They get a mail.`} />}
      <fieldset>
        <legend className="sr-only">Apprentices</legend>
        {apprentices.map((apprentice) => (
          <Checkbox
            key={apprentice.id}
            label={apprentice.name}
            hint={apprentice.holds ? "has it; giving it again changes the date" : undefined}
            checked={chosen.includes(apprentice.id)}
            onChange={(event) => setChosen(event.target.checked ? [...chosen, apprentice.id] : chosen.filter((id) => id !== apprentice.id))}
          />
        ))}
        {apprentices.length === 0 && <p className="text-ink2">Nobody trains here today.</p>}
      </fieldset>
      <TextField label="To be known by" type="date" value={dueOn} min={today} onChange={(event) => setDueOn(event.target.value)} required className="max-w-60" />
      <Button kind="main" type="submit" disabled={give.isPending || chosen.length === 0} className="justify-self-start">
        Give it
      </Button>
    </form>
  );
}
