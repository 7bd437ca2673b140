"use client";

import { useState } from "react";
import type { SheetMark } from "@/components/observations/use-marks";
import { limitsText } from "@/components/practice/criteria-list";
import { SelectField, TextField } from "@/components/ui/field";
import { Segmented } from "@/components/ui/segmented";
import { Tag, Value } from "@/components/ui/tag";
import { formatDay } from "@/lib/core/dates";
import type { Criterion, Mark, ReadingSpec, TakenReading } from "@/lib/core/tasks/types";

const MARK_CHOICES = [
  { value: "met", label: "Met" },
  { value: "not_yet", label: "Not yet", strong: true },
  { value: "not_seen", label: "Not seen", strong: true },
] as const satisfies readonly { value: Mark; label: string; strong?: boolean }[];

export type SheetInstrument = { id: string; label: string; kind: string; unit: string; calibrationDueOn: string };

type CriterionRowProps = {
  criterion: Criterion;
  mark: SheetMark;
  refusal: string | undefined;
  instruments: SheetInstrument[];
  today: string;
  onChange: (patch: Partial<Omit<SheetMark, "key" | "judged">>) => void;
};

/** One criterion: one large press, a reading where it asks for one, prompts and a remark when they are wanted. */
export function CriterionRow({ criterion, mark, refusal, instruments, today, onChange }: CriterionRowProps) {
  const [noting, setNoting] = useState(mark.remark !== "");
  return (
    <li id={`criterion-${criterion.key}`} className="grid gap-2.5 border-b border-rule px-4 py-4 last:border-b-0">
      <div>
        <p className="text-[1.05rem] font-semibold">
          {criterion.text} {criterion.safetyCritical && <Tag kind="safety">safety</Tag>}
        </p>
        {criterion.metLooksLike && <p className="text-sm text-ink2">{criterion.metLooksLike}</p>}
      </div>
      {criterion.reading && (
        <ReadingEntry
          key={mark.reading ? "taken" : "open"}
          spec={criterion.reading}
          reading={mark.reading}
          instruments={instruments}
          today={today}
          label={criterion.text}
          onChange={(reading) => onChange({ reading, mark: null })}
        />
      )}
      {mark.judged && (
        <p className={`font-plate text-[1.25rem] font-semibold leading-tight ${mark.judged.verdict === "inside" ? "text-strong" : "text-paint-text"}`} role="status">
          {mark.judged.sentence}
        </p>
      )}
      <Segmented legend={criterion.text} name={criterion.key} value={mark.mark} choices={MARK_CHOICES} onChange={(value) => onChange({ mark: value })} height={52} />
      {refusal && (
        <p role="alert" className="text-sm font-semibold text-paint-text">
          {refusal}
        </p>
      )}
      <div className="flex flex-wrap items-center gap-x-3 gap-y-1">
        <Prompts count={mark.prompts} onChange={(prompts) => onChange({ prompts })} />
        {!noting && (
          <button type="button" className="min-h-11 px-1 underline underline-offset-4" onClick={() => setNoting(true)}>
            Add a remark
          </button>
        )}
      </div>
      {noting && (
        <TextField label="Remark" defaultValue={mark.remark} maxLength={500} onBlur={(event) => event.target.value !== mark.remark && onChange({ remark: event.target.value })} />
      )}
    </li>
  );
}

function Prompts({ count, onChange }: { count: number; onChange: (count: number) => void }) {
  return (
    <span className="inline-flex items-center">
      <button type="button" className="min-h-11 px-1 underline underline-offset-4" onClick={() => onChange(Math.min(99, count + 1))}>
        {count === 0 ? "Needed a prompt" : `${count} ${count === 1 ? "prompt" : "prompts"}, one more`}
      </button>
      {count > 0 && (
        <button type="button" className="min-h-11 min-w-11 text-[1.2rem]" aria-label="One prompt fewer" onClick={() => onChange(count - 1)}>
          −
        </button>
      )}
    </span>
  );
}

type ReadingEntryProps = {
  spec: ReadingSpec;
  reading: TakenReading | null;
  instruments: SheetInstrument[];
  today: string;
  label: string;
  onChange: (reading: TakenReading | null) => void;
};

function ReadingEntry({ spec, reading, instruments, today, label, onChange }: ReadingEntryProps) {
  const fitting = instruments.filter((instrument) => spec.instrumentKind === null || instrument.kind === spec.instrumentKind);
  const [text, setText] = useState(reading ? String(reading.value) : "");
  const [instrumentId, setInstrumentId] = useState(reading?.instrumentId ?? fitting.find((instrument) => instrument.calibrationDueOn >= today)?.id ?? "");
  const value = Number(text.trim().replace(",", "."));
  const understood = text.trim() !== "" && Number.isFinite(value);
  const commit = (chosen: string) => {
    if (text.trim() === "") {
      if (reading) onChange(null);
    } else if (understood && (value !== reading?.value || (chosen || null) !== reading?.instrumentId)) {
      onChange({ value, unit: spec.unit, instrumentId: chosen || null, instrumentInDate: null });
    }
  };
  return (
    <div className="grid gap-2 sm:grid-cols-[12rem_1fr]">
      <label className="flex items-center gap-2 rounded border-[1.5px] border-strong bg-chalk px-3 focus-within:outline-3 focus-within:outline-ink">
        <span className="sr-only">{`${spec.quantity}, ${label}`}</span>
        <input
          className="tabular min-h-14 w-full min-w-0 bg-transparent font-mono text-[1.7rem] outline-none"
          inputMode="decimal"
          autoComplete="off"
          value={text}
          onChange={(event) => setText(event.target.value)}
          onBlur={() => commit(instrumentId)}
          onKeyDown={(event) => event.key === "Enter" && commit(instrumentId)}
          aria-invalid={text.trim() !== "" && !understood ? true : undefined}
        />
        <span className="font-mono text-[1.3rem]">{spec.unit}</span>
      </label>
      <div className="grid content-center gap-1 text-sm text-ink2">
        <span>
          {spec.quantity}: <Value>{limitsText(spec)}</Value> {spec.mode === "found" && "(found: right measuring and conclusion count)"}
        </span>
        {fitting.length > 0 && (
          <SelectField
            label={<span className="text-sm">Instrument</span>}
            value={instrumentId}
            onChange={(event) => {
              setInstrumentId(event.target.value);
              commit(event.target.value);
            }}
          >
            <option value="">none named</option>
            {fitting.map((instrument) => (
              <option key={instrument.id} value={instrument.id}>
                {instrument.label}, {instrument.kind}, {instrument.calibrationDueOn < today ? "OUT OF DATE since" : "in date to"} {formatDay(instrument.calibrationDueOn)}
              </option>
            ))}
          </SelectField>
        )}
      </div>
    </div>
  );
}
