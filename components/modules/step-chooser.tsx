"use client";

import { SelectField } from "@/components/ui/field";
import { Value } from "@/components/ui/tag";
import { formatClock } from "@/lib/core/webvtt/timestamps";

export type ChoosableStep = { id: string; title: string; recordingTitle: string; startMs: number; endMs: number; questions: number };

type StepChooserProps = { available: ChoosableStep[]; chosen: string[]; onChange: (stepIds: string[]) => void };

/** Steps of one or several recordings in the order in which they are learned. Moved by buttons: no drag needed. */
export function StepChooser({ available, chosen, onChange }: StepChooserProps) {
  const byId = new Map(available.map((step) => [step.id, step]));
  const rest = available.filter((step) => !chosen.includes(step.id));
  const move = (from: number, to: number) => {
    const next = [...chosen];
    const [id] = next.splice(from, 1);
    if (id) next.splice(to, 0, id);
    onChange(next);
  };
  return (
    <fieldset className="grid gap-3">
      <legend className="mb-1 text-[1.1rem]">Steps</legend>
      <ol className="rounded border border-rule bg-chalk">
        {chosen.map((id, index) => {
          const step = byId.get(id);
          const name = step?.title ?? "a step that is gone";
          return (
            <li key={id} className="flex flex-wrap items-center gap-x-2 border-b border-rule pl-3 last:border-b-0">
              <span className="tabular w-6 font-mono text-ink2">{index + 1}</span>
              <span className="min-w-0 flex-1 basis-52 py-2">
                {name}
                <span className="block text-sm text-ink2">
                  {step && `${step.recordingTitle} · ${step.questions} ${step.questions === 1 ? "question" : "questions"}`}
                </span>
              </span>
              {step && <Value className="text-sm text-ink2 max-sm:hidden">{formatClock(step.endMs - step.startMs)}</Value>}
              <RowButton label={`Move “${name}” up`} sign="↑" disabled={index === 0} onClick={() => move(index, index - 1)} />
              <RowButton label={`Move “${name}” down`} sign="↓" disabled={index === chosen.length - 1} onClick={() => move(index, index + 1)} />
              <RowButton label={`Leave “${name}” out`} sign="×" onClick={() => onChange(chosen.filter((other) => other !== id))} />
            </li>
          );
        })}
        {chosen.length === 0 && <li className="px-3 py-3 text-ink2">No steps yet. Add them below.</li>}
      </ol>
      {rest.length > 0 && (
        <SelectField label="Add a step" value="" onChange={(event) => event.target.value && onChange([...chosen, event.target.value])}>
          <option value="">choose a step</option>
          {rest.map((step) => (
            <option key={step.id} value={step.id}>
              {step.recordingTitle}: {step.title}
            </option>
          ))}
        </SelectField>
      )}
    </fieldset>
  );
}

function RowButton({ label, sign, disabled = false, onClick }: { label: string; sign: string; disabled?: boolean; onClick: () => void }) {
  return (
    <button type="button" aria-label={label} disabled={disabled} onClick={onClick} className="size-11 border-l border-rule text-[1.2rem] disabled:opacity-30">
      {sign}
    </button>
  );
}
