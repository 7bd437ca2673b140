"use client";

import { NumberField } from "@/components/bench/number-field";
import { OrderEditor } from "@/components/bench/order-editor";
import { shortTime, TimeField } from "@/components/bench/time-field";
import { Button } from "@/components/ui/button";
import { Checkbox, SelectField, TextArea, TextField } from "@/components/ui/field";
import { Segmented } from "@/components/ui/segmented";
import { KeyCap } from "@/components/ui/tag";
import { questionProblems } from "@/lib/core/questions/question-problems";
import type { NumberBody, OneOfBody, Question, QuestionBody, QuestionKind } from "@/lib/core/questions/types";
import type { Step } from "@/lib/core/steps/types";
import { UNITS } from "@/lib/core/units/units";

type QuestionEditorProps = {
  question: Question;
  step: Step | undefined;
  steps: Step[];
  atMs: number;
  onChange: (question: Question) => void;
  onRemove: () => void;
};

const KINDS: { value: QuestionKind; label: string }[] = [
  { value: "one_of", label: "One of" },
  { value: "number", label: "Number" },
  { value: "put_in_order", label: "Put in order" },
];

/** An empty body of each kind. */
export function emptyBody(kind: QuestionKind): QuestionBody {
  const choice = (right: boolean) => ({ id: crypto.randomUUID(), text: "", right, why: "" });
  if (kind === "one_of") return { kind, choices: [choice(true), choice(false)] };
  if (kind === "number") return { kind, unit: "mm", value: NaN, tolerance: 0, slips: [] };
  return { kind, items: [{ id: crypto.randomUUID(), text: "" }, { id: crypto.randomUUID(), text: "" }], neverBefore: [] };
}

/** One step question of any kind. */
export function QuestionEditor({ question, step, steps, atMs, onChange, onRemove }: QuestionEditorProps) {
  const patch = (change: Partial<Question>) => onChange({ ...question, ...change });
  const problems = questionProblems(question, step);
  const inside = (ms: number): number => (step ? Math.min(Math.max(ms, step.startMs), step.endMs) : ms);
  return (
    <div className="grid gap-3">
      <Segmented legend="Kind of question" name={`kind-${question.id}`} value={question.body.kind} choices={KINDS} onChange={(kind) => patch({ body: emptyBody(kind) })} />
      <TextArea label="Question" rows={2} value={question.prompt} maxLength={500} onChange={(event) => patch({ prompt: event.target.value })} />
      {question.body.kind === "one_of" && <OneOfEditor body={question.body} onChange={(body) => patch({ body })} />}
      {question.body.kind === "number" && <NumberEditor body={question.body} onChange={(body) => patch({ body })} />}
      {question.body.kind === "put_in_order" && <OrderEditor body={question.body} steps={steps} onChange={(body) => patch({ body })} />}
      <TextArea label="Why it is right" rows={2} value={question.explanation} maxLength={1000} onChange={(event) => patch({ explanation: event.target.value })} hint="Shown once the answer was right" />
      <Checkbox label="Safety-critical: must always be right" checked={question.safetyCritical} onChange={(event) => patch({ safetyCritical: event.target.checked })} />
      <div className="grid grid-cols-2 items-end gap-x-2 gap-y-3">
        <TimeField label="Asked at" ms={question.atMs} onChange={(ms) => patch({ atMs: inside(ms) })} />
        <Button onClick={() => patch({ atMs: inside(atMs) })}>Ask it here</Button>
        <TimeField label="Look again from" ms={question.lookAgainMs} onChange={(ms) => patch({ lookAgainMs: ms })} />
        <Button onClick={() => patch({ lookAgainMs: atMs })}>Look again from here</Button>
      </div>
      {question.lookAgainMs > question.atMs && <p className="text-sm text-ink2">Looking again begins after the question: {shortTime(question.lookAgainMs)}.</p>}
      <Button onClick={onRemove}>
        <KeyCap>Del</KeyCap> Remove this question
      </Button>
      {problems.length > 0 && (
        <ul aria-label="Not finished" className="list-disc border-l-[6px] border-steel bg-chalk py-2 pl-8 pr-3">
          {problems.map((problem) => (
            <li key={problem}>{problem}</li>
          ))}
        </ul>
      )}
    </div>
  );
}

function OneOfEditor({ body, onChange }: { body: OneOfBody; onChange: (body: OneOfBody) => void }) {
  const change = (id: string, patch: Partial<OneOfBody["choices"][number]>) =>
    onChange({ ...body, choices: body.choices.map((choice) => (choice.id === id ? { ...choice, ...patch } : choice)) });
  return (
    <fieldset className="grid gap-3">
      <legend className="mb-1 text-[1.1rem]">Choices; one is right</legend>
      {body.choices.map((choice, index) => (
        <div key={choice.id} className={`grid grid-cols-[2.75rem_minmax(0,1fr)] gap-x-1 rounded border bg-chalk py-2 pr-3 ${choice.right ? "border-strong" : "border-rule"}`}>
          <label className="grid min-h-11 place-items-center self-center">
            <span className="sr-only">Choice {index + 1} is right</span>
            <input
              type="radio"
              name="right-choice"
              className="size-6 accent-(--strong)"
              checked={choice.right}
              onChange={() => onChange({ ...body, choices: body.choices.map((other) => ({ ...other, right: other.id === choice.id })) })}
            />
          </label>
          <div className="grid gap-1.5">
            <div className="flex items-end gap-2">
              <TextField
                className="min-w-0 flex-1"
                label={choice.right ? `Choice ${index + 1}, the right one` : `Choice ${index + 1}`}
                value={choice.text}
                maxLength={300}
                onChange={(event) => change(choice.id, { text: event.target.value })}
              />
              <Button
                className="w-11 px-0!"
                aria-label={`Remove choice ${index + 1}`}
                disabled={body.choices.length <= 2}
                onClick={() => onChange({ ...body, choices: body.choices.filter((other) => other.id !== choice.id) })}
              >
                ×
              </Button>
            </div>
            <TextField label="What to say to it" value={choice.why} maxLength={300} onChange={(event) => change(choice.id, { why: event.target.value })} />
          </div>
        </div>
      ))}
      <Button disabled={body.choices.length >= 12} onClick={() => onChange({ ...body, choices: [...body.choices, { id: crypto.randomUUID(), text: "", right: false, why: "" }] })}>Add a choice</Button>
    </fieldset>
  );
}

function NumberEditor({ body, onChange }: { body: NumberBody; onChange: (body: NumberBody) => void }) {
  const change = (at: number, patch: Partial<NumberBody["slips"][number]>) => onChange({ ...body, slips: body.slips.map((slip, index) => (index === at ? { ...slip, ...patch } : slip)) });
  return (
    <fieldset className="grid gap-3">
      <legend className="sr-only">The right value</legend>
      <div className="grid grid-cols-3 items-start gap-2">
        <NumberField label="Value" value={body.value} onChange={(value) => onChange({ ...body, value: value ?? NaN })} />
        <NumberField label="± within" min={0} value={body.tolerance} onChange={(tolerance) => onChange({ ...body, tolerance: tolerance ?? NaN })} />
        <SelectField label="Unit" value={body.unit} onChange={(event) => onChange({ ...body, unit: event.target.value })}>
          {UNITS.map((unit) => (
            <option key={unit.symbol}>{unit.symbol}</option>
          ))}
        </SelectField>
      </div>
      {body.slips.map((slip, index) => (
        // Slips have no id of their own: their place is what they are.
        <div key={index} className="grid grid-cols-[6rem_1fr_auto] items-end gap-2">
          <NumberField label="Slip" value={slip.value} onChange={(value) => change(index, { value: value ?? NaN })} />
          <TextField label="What went wrong" value={slip.hint} maxLength={300} onChange={(event) => change(index, { hint: event.target.value })} />
          <Button aria-label={`Remove slip ${index + 1}`} onClick={() => onChange({ ...body, slips: body.slips.filter((_, other) => other !== index) })}>
            ×
          </Button>
        </div>
      ))}
      <Button disabled={body.slips.length >= 12} onClick={() => onChange({ ...body, slips: [...body.slips, { value: NaN, hint: "" }] })}>
        Add a slip that we know
      </Button>
    </fieldset>
  );
}
