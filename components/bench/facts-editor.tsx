"use client";

import { ListEditor } from "@/components/bench/list-editor";
import { NumberField } from "@/components/bench/number-field";
import { Button } from "@/components/ui/button";
import { Checkbox, SelectField, TextField } from "@/components/ui/field";
import { Value } from "@/components/ui/tag";
import { SIGNS } from "@/lib/core/steps/iso-7010";
import { formatTightening, parseTightening } from "@/lib/core/steps/parse-tightening";
import { CAUTION_GRADES, type Caution, type CautionGrade, type Fastener, type StepFacts } from "@/lib/core/steps/types";

type FactsEditorProps = { facts: StepFacts; onChange: (facts: StepFacts) => void };

const DEFAULT_SOURCE = "maker's data for this vehicle";

/** What one step needs to be known of, typed so that the program can compute with it. */
export function FactsEditor({ facts, onChange }: FactsEditorProps) {
  const patch = (change: Partial<StepFacts>) => onChange({ ...facts, ...change });
  const newCaution = (): Caution => ({ id: crypto.randomUUID(), grade: "caution", sign: "W001", hazard: "", instruction: "", waitSeconds: null });
  const newFastener = (): Fastener => ({ id: crypto.randomUUID(), name: "", count: 1, acrossFlatsMm: null, oneTimeUse: false, tightening: null });
  return (
    <div className="grid gap-4">
      <section className="grid gap-3">
        <h3 className="text-[1.15rem]">Cautions, shown before the step</h3>
        {facts.cautions.map((caution) => (
          <CautionEditor
            key={caution.id}
            caution={caution}
            onChange={(next) => patch({ cautions: facts.cautions.map((other) => (other.id === next.id ? next : other)) })}
            onRemove={() => patch({ cautions: facts.cautions.filter((other) => other.id !== caution.id) })}
          />
        ))}
        <Button onClick={() => patch({ cautions: [...facts.cautions, newCaution()] })}>Add a caution</Button>
      </section>
      <section className="grid gap-3">
        <h3 className="text-[1.15rem]">Fasteners</h3>
        {facts.fasteners.map((fastener) => (
          <FastenerEditor
            key={fastener.id}
            fastener={fastener}
            onChange={(next) => patch({ fasteners: facts.fasteners.map((other) => (other.id === next.id ? next : other)) })}
            onRemove={() => patch({ fasteners: facts.fasteners.filter((other) => other.id !== fastener.id) })}
          />
        ))}
        <Button onClick={() => patch({ fasteners: [...facts.fasteners, newFastener()] })}>Add a fastener</Button>
      </section>
      <ListEditor label="Tools" items={facts.tools} onChange={(tools) => patch({ tools })} />
      <ListEditor label="Parts" items={facts.parts} onChange={(parts) => patch({ parts })} />
      <FluidsEditor fluids={facts.fluids} onChange={(fluids) => patch({ fluids })} />
      <ListEditor
        label="Fault codes" items={facts.faultCodes} hint="Like P0301, one on each line" onChange={(codes) => patch({ faultCodes: codes.map((code) => code.toUpperCase()) })} />
    </div>
  );
}

type Fluid = StepFacts["fluids"][number];

function FluidsEditor({ fluids, onChange }: { fluids: Fluid[]; onChange: (fluids: Fluid[]) => void }) {
  const change = (at: number, patch: Partial<Fluid>) => onChange(fluids.map((fluid, index) => (index === at ? { ...fluid, ...patch } : fluid)));
  return (
    <section className="grid gap-3">
      <h3 className="text-[1.15rem]">Fluids</h3>
      {fluids.map((fluid, index) => (
        // Fluids have no id of their own: their place is what they are.
        <div key={index} className="grid grid-cols-[1fr_7rem_auto] items-end gap-2">
          <TextField label="Fluid" value={fluid.kind} maxLength={120} onChange={(event) => change(index, { kind: event.target.value })} />
          <TextField label="Amount" value={fluid.amount} maxLength={60} onChange={(event) => change(index, { amount: event.target.value })} />
          <Button aria-label={`Remove fluid ${index + 1}`} onClick={() => onChange(fluids.filter((_, other) => other !== index))}>
            ×
          </Button>
        </div>
      ))}
      <Button onClick={() => onChange([...fluids, { kind: "", amount: "" }])}>Add a fluid</Button>
    </section>
  );
}

type CautionEditorProps = { caution: Caution; onChange: (caution: Caution) => void; onRemove: () => void };

function CautionEditor({ caution, onChange, onRemove }: CautionEditorProps) {
  return (
    <div className="grid gap-2 rounded border border-rule border-l-[6px] border-l-caution bg-chalk p-3">
      <div className="grid grid-cols-2 gap-2">
        <SelectField label="Grade" value={caution.grade} onChange={(event) => onChange({ ...caution, grade: event.target.value as CautionGrade })}>
          {CAUTION_GRADES.map((grade) => (
            <option key={grade}>{grade}</option>
          ))}
        </SelectField>
        <SelectField label="Sign" value={caution.sign} onChange={(event) => onChange({ ...caution, sign: event.target.value })}>
          {Object.entries(SIGNS).map(([id, meaning]) => (
            <option key={id} value={id}>
              {id} {meaning}
            </option>
          ))}
        </SelectField>
      </div>
      <TextField label="What can hurt" value={caution.hazard} maxLength={200} onChange={(event) => onChange({ ...caution, hazard: event.target.value })} />
      <TextField label="What to do, and how it shows" value={caution.instruction} maxLength={400} onChange={(event) => onChange({ ...caution, instruction: event.target.value })} />
      <NumberField
        label="Wait before going on, seconds"
        min={1}
        value={caution.waitSeconds}
        onChange={(seconds) => onChange({ ...caution, waitSeconds: seconds === null ? null : Math.min(Math.round(seconds), 86_400) })}
        hint="Like the time that a system takes to lose its charge. Empty: no waiting."
      />
      <Button kind="quiet" onClick={onRemove}>
        Remove this caution
      </Button>
    </div>
  );
}

type FastenerEditorProps = { fastener: Fastener; onChange: (fastener: Fastener) => void; onRemove: () => void };

function FastenerEditor({ fastener, onChange, onRemove }: FastenerEditorProps) {
  const { tightening } = fastener;
  const parsed = tightening ? parseTightening(tightening.entered) : null;
  const enter = (entered: string) => {
    if (entered.trim() === "") return onChange({ ...fastener, tightening: null });
    const understood = parseTightening(entered);
    const numbers = "problem" in understood ? { newtonMetres: 0, angleDegrees: null } : understood;
    onChange({ ...fastener, tightening: { entered, source: tightening?.source ?? DEFAULT_SOURCE, ...numbers } });
  };
  return (
    <div className="grid gap-2 rounded border border-rule bg-chalk p-3">
      <TextField label="Fastener" value={fastener.name} maxLength={120} onChange={(event) => onChange({ ...fastener, name: event.target.value })} />
      <div className="grid grid-cols-2 gap-2">
        <NumberField label="How many" min={1} value={fastener.count} onChange={(count) => onChange({ ...fastener, count: Math.min(Math.round(count ?? 1), 200) })} />
        <NumberField label="Across flats, mm" value={fastener.acrossFlatsMm} onChange={(acrossFlatsMm) => onChange({ ...fastener, acrossFlatsMm })} />
      </div>
      <TextField
        label="Tightening value"
        value={tightening?.entered ?? ""}
        maxLength={80}
        onChange={(event) => enter(event.target.value)}
        hint={parsed && !("problem" in parsed) ? <span className="text-base text-ink">Understood as <Value className="font-semibold">{formatTightening(parsed)}</Value></span> : "Like 25 Nm, 18 lbf ft, 50 Nm + 90°"}
        error={parsed && "problem" in parsed ? parsed.problem : undefined}
      />
      {tightening && (
        <TextField
          label="Where the value comes from"
          value={tightening.source}
          maxLength={300}
          onChange={(event) => onChange({ ...fastener, tightening: { ...tightening, source: event.target.value } })}
          error={tightening.source.trim() === "" ? "Without a source it can’t be published." : undefined}
        />
      )}
      <Checkbox label="New each time" checked={fastener.oneTimeUse} onChange={(event) => onChange({ ...fastener, oneTimeUse: event.target.checked })} />
      <Button kind="quiet" onClick={onRemove}>
        Remove this fastener
      </Button>
    </div>
  );
}
