"use client";

import { Button } from "@/components/ui/button";
import { Checkbox, SelectField, TextArea, TextField } from "@/components/ui/field";
import { questionProblems } from "@/lib/core/questions/question-problems";
import type { NumberBody, OneOfBody, PutInOrderBody, Question, QuestionBody, QuestionKind } from "@/lib/core/questions/types";
import type { Step } from "@/lib/core/steps/types";
import { UNITS } from "@/lib/core/units/units";
import { formatClock } from "@/lib/core/webvtt/timestamps";

type QuestionEditorProps = {
  question: Question;
  number: number;
  step: Step | undefined;
  steps: Step[];
  atMs: number;
  onChange: (question: Question) => void;
  onRemove: () => void;
};

const KINDS: Record<QuestionKind, string> = { one_of: "one of", number: "number with unit", put_in_order: "put in order" };

/** An empty body of each kind. */
export function emptyBody(kind: QuestionKind): QuestionBody {
  const choice = (right: boolean) => ({ id: crypto.randomUUID(), text: "", right, why: "" });
  if (kind === "one_of") return { kind, choices: [choice(true), choice(false)] };
  if (kind === "number") return { kind, unit: "mm", value: 0, tolerance: 0, slips: [] };
  return { kind, items: [{ id: crypto.randomUUID(), text: "" }, { id: crypto.randomUUID(), text: "" }], neverBefore: [] };
}

/** One step question of any kind. */
export function QuestionEditor({ question, number, step, steps, atMs, onChange, onRemove }: QuestionEditorProps) {
  const patch = (change: Partial<Question>) => onChange({ ...question, ...change });
  const problems = questionProblems(question, step);
  return (
    <div className="grid gap-3">
      <h2 className="text-[1.4rem] leading-tight">
        Question {number} at {formatClock(question.atMs)}
      </h2>
      <SelectField label="Kind" value={question.body.kind} onChange={(event) => patch({ body: emptyBody(event.target.value as QuestionKind) })}>
        {Object.entries(KINDS).map(([kind, words]) => (
          <option key={kind} value={kind}>
            {words}
          </option>
        ))}
      </SelectField>
      <TextArea label="Question" rows={2} value={question.prompt} maxLength={500} onChange={(event) => patch({ prompt: event.target.value })} />
      {question.body.kind === "one_of" && <OneOfEditor body={question.body} onChange={(body) => patch({ body })} />}
      {question.body.kind === "number" && <NumberEditor body={question.body} onChange={(body) => patch({ body })} />}
      {question.body.kind === "put_in_order" && <OrderEditor body={question.body} steps={steps} onChange={(body) => patch({ body })} />}
      <TextArea label="Why it is right" rows={2} value={question.explanation} maxLength={1000} onChange={(event) => patch({ explanation: event.target.value })} hint="Shown once the answer was right" />
      <Checkbox label="Safety-critical: must always be right" checked={question.safetyCritical} onChange={(event) => patch({ safetyCritical: event.target.checked })} />
      <div className="flex flex-wrap gap-2">
        <Button onClick={() => patch({ lookAgainMs: atMs })}>Look again at {formatClock(question.lookAgainMs)}: set to here</Button>
        <Button onClick={() => step && patch({ atMs: Math.min(Math.max(atMs, step.startMs), step.endMs) })}>Ask it here</Button>
        <Button kind="quiet" onClick={onRemove}>
          Remove this question
        </Button>
      </div>
      {problems.length > 0 && (
        <ul className="list-disc pl-5 text-paint-text">
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
        <div key={choice.id} className="grid grid-cols-[2.75rem_1fr] gap-2 border-l-4 border-rule pl-2">
          <label className="grid min-h-11 place-items-center">
            <span className="sr-only">Choice {index + 1} is right</span>
            <input
              type="radio"
              name="right-choice"
              className="size-5 accent-(--strong)"
              checked={choice.right}
              onChange={() => onChange({ ...body, choices: body.choices.map((other) => ({ ...other, right: other.id === choice.id })) })}
            />
          </label>
          <div className="grid gap-1">
            <TextField label={`Choice ${index + 1}`} value={choice.text} maxLength={300} onChange={(event) => change(choice.id, { text: event.target.value })} />
            <TextField label="Why, to whoever chooses it" value={choice.why} maxLength={300} onChange={(event) => change(choice.id, { why: event.target.value })} />
            {body.choices.length > 2 && (
              <Button kind="quiet" onClick={() => onChange({ ...body, choices: body.choices.filter((other) => other.id !== choice.id) })}>
                Remove choice {index + 1}
              </Button>
            )}
          </div>
        </div>
      ))}
      <Button onClick={() => onChange({ ...body, choices: [...body.choices, { id: crypto.randomUUID(), text: "", right: false, why: "" }] })}>Add a choice</Button>
    </fieldset>
  );
}

function NumberEditor({ body, onChange }: { body: NumberBody; onChange: (body: NumberBody) => void }) {
  return (
    <fieldset className="grid grid-cols-3 items-end gap-2">
      <legend className="sr-only">The right value</legend>
      <TextField label="Value" type="number" step="any" value={body.value} onChange={(event) => onChange({ ...body, value: Number(event.target.value) })} />
      <TextField label="± tolerance" type="number" step="any" min={0} value={body.tolerance} onChange={(event) => onChange({ ...body, tolerance: Number(event.target.value) })} />
      <SelectField label="Unit" value={body.unit} onChange={(event) => onChange({ ...body, unit: event.target.value })}>
        {UNITS.map((unit) => (
          <option key={unit.symbol}>{unit.symbol}</option>
        ))}
      </SelectField>
    </fieldset>
  );
}

function OrderEditor({ body, steps, onChange }: { body: PutInOrderBody; steps: Step[]; onChange: (body: PutInOrderBody) => void }) {
  const fromSteps = (list: Step[]) => onChange({ ...body, items: list.map((step) => ({ id: crypto.randomUUID(), text: step.title })), neverBefore: [] });
  const move = (from: number, to: number) => {
    const items = [...body.items];
    const [item] = items.splice(from, 1);
    if (item) items.splice(to, 0, item);
    onChange({ ...body, items });
  };
  return (
    <fieldset className="grid gap-2">
      <legend className="mb-1 text-[1.1rem]">In the right order, first on top</legend>
      {body.items.map((item, index) => (
        <div key={item.id} className="flex items-end gap-2">
          <TextField
            label={`Place ${index + 1}`}
            value={item.text}
            maxLength={300}
            className="flex-1"
            onChange={(event) => onChange({ ...body, items: body.items.map((other) => (other.id === item.id ? { ...other, text: event.target.value } : other)) })}
          />
          <Button aria-label={`Move place ${index + 1} up`} disabled={index === 0} onClick={() => move(index, index - 1)}>
            ↑
          </Button>
          {body.items.length > 2 && (
            <Button
              aria-label={`Remove place ${index + 1}`}
              onClick={() => onChange({ ...body, items: body.items.filter((other) => other.id !== item.id), neverBefore: body.neverBefore.filter((pair) => !pair.includes(item.id)) })}
            >
              ×
            </Button>
          )}
        </div>
      ))}
      <div className="flex flex-wrap gap-2">
        <Button onClick={() => onChange({ ...body, items: [...body.items, { id: crypto.randomUUID(), text: "" }] })}>Add one</Button>
        <Button onClick={() => fromSteps(steps)}>Make it from the steps</Button>
        <Button onClick={() => fromSteps(steps.toReversed())}>Reversed, for refitting</Button>
      </div>
    </fieldset>
  );
}
