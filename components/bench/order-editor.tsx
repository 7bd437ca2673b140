"use client";

import { Button } from "@/components/ui/button";
import { Checkbox, TextField } from "@/components/ui/field";
import type { PutInOrderBody } from "@/lib/core/questions/types";
import type { Step } from "@/lib/core/steps/types";

type OrderEditorProps = { body: PutInOrderBody; steps: Step[]; onChange: (body: PutInOrderBody) => void };

/** The most things that a question may put in order. */
const MOST = 20;

/** Things in their right order: written one by one, or made from the steps either way round. */
export function OrderEditor({ body, steps, onChange }: OrderEditorProps) {
  const fromSteps = (list: Step[]) =>
    onChange({ ...body, items: list.slice(0, MOST).map((step) => ({ id: crypto.randomUUID(), text: step.title })), neverBefore: [] });
  const move = (from: number, to: number) => {
    const items = [...body.items];
    const [item] = items.splice(from, 1);
    if (item) items.splice(to, 0, item);
    // What hurts the other way round can't be the right order as well.
    onChange({ ...body, items, neverBefore: body.neverBefore.filter((pair) => !isAsWritten(items, pair)) });
  };
  /** That `later` is done before `earlier` can hurt. */
  const hurts = (later: string, earlier: string) => body.neverBefore.some(([first, second]) => first === later && second === earlier);
  const setHurts = (later: string, earlier: string, on: boolean) =>
    onChange({
      ...body,
      neverBefore: on ? [...body.neverBefore, [later, earlier]] : body.neverBefore.filter(([first, second]) => first !== later || second !== earlier),
    });
  return (
    <fieldset className="grid gap-3">
      <legend className="mb-1 text-[1.1rem]">In the right order, first on top</legend>
      <div className="flex flex-wrap gap-2">
        <Button disabled={steps.length < 2} onClick={() => fromSteps(steps)}>
          Make from the steps
        </Button>
        <Button disabled={steps.length < 2} onClick={() => fromSteps(steps.toReversed())}>
          Reversed, for refitting
        </Button>
      </div>
      {body.items.map((item, index) => {
        const before = body.items[index - 1];
        return (
          <div key={item.id} className="grid gap-1">
            <div className="flex items-end gap-1.5">
              <TextField
                label={`Place ${index + 1}`}
                value={item.text}
                maxLength={300}
                className="min-w-0 flex-1"
                onChange={(event) => onChange({ ...body, items: body.items.map((other) => (other.id === item.id ? { ...other, text: event.target.value } : other)) })}
              />
              <Button className="w-11 px-0!" aria-label={`Move place ${index + 1} up`} disabled={index === 0} onClick={() => move(index, index - 1)}>
                ↑
              </Button>
              <Button className="w-11 px-0!" aria-label={`Move place ${index + 1} down`} disabled={index === body.items.length - 1} onClick={() => move(index, index + 1)}>
                ↓
              </Button>
              <Button
                className="w-11 px-0!"
                aria-label={`Remove place ${index + 1}`}
                disabled={body.items.length <= 2}
                onClick={() => onChange({ ...body, items: body.items.filter((other) => other.id !== item.id), neverBefore: body.neverBefore.filter((pair) => !pair.includes(item.id)) })}
              >
                ×
              </Button>
            </div>
            {before && (
              <Checkbox
                label={<span className="text-sm text-ink2">Hurts if done before place {index}: never right that way round</span>}
                checked={hurts(item.id, before.id)}
                onChange={(event) => setHurts(item.id, before.id, event.target.checked)}
              />
            )}
          </div>
        );
      })}
      <Button disabled={body.items.length >= MOST} onClick={() => onChange({ ...body, items: [...body.items, { id: crypto.randomUUID(), text: "" }] })}>
        Add one
      </Button>
    </fieldset>
  );
}

function isAsWritten(items: PutInOrderBody["items"], [first, second]: [string, string]): boolean {
  const place = (id: string) => items.findIndex((item) => item.id === id);
  return place(first) <= place(second);
}
