"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Radio, SelectField, TextField } from "@/components/ui/field";
import type { AskedQuestion, GivenAnswer } from "@/lib/core/questions/types";
import { findUnit, UNITS } from "@/lib/core/units/units";

type AnswerFormProps = { asked: AskedQuestion; busy: boolean; onAnswer: (given: GivenAnswer) => void };

/** The form that fits the question's kind. Nothing in it knows what is right. */
export function AnswerForm({ asked, busy, onAnswer }: AnswerFormProps) {
  const { ask } = asked;
  if (ask.kind === "one_of") return <OneOfForm choices={ask.choices} busy={busy} onAnswer={onAnswer} />;
  if (ask.kind === "number") return <NumberForm unit={ask.unit} busy={busy} onAnswer={onAnswer} />;
  return <OrderForm items={ask.items} busy={busy} onAnswer={onAnswer} />;
}

type Part = { busy: boolean; onAnswer: (given: GivenAnswer) => void };
type Item = { id: string; text: string };

function OneOfForm({ choices, busy, onAnswer }: Part & { choices: Item[] }) {
  const [chosen, setChosen] = useState<string | null>(null);
  return (
    <form
      className="grid gap-2"
      onSubmit={(event) => {
        event.preventDefault();
        if (chosen) onAnswer({ kind: "one_of", choiceId: chosen });
      }}
    >
      <fieldset className="grid gap-2">
        <legend className="sr-only">Choose one</legend>
        {choices.map((choice) => (
          <Radio key={choice.id} name="choice" label={choice.text} checked={chosen === choice.id} onChange={() => setChosen(choice.id)} />
        ))}
      </fieldset>
      <Button kind="main" type="submit" disabled={busy || chosen === null}>
        Answer
      </Button>
    </form>
  );
}

function NumberForm({ unit, busy, onAnswer }: Part & { unit: string }) {
  const [text, setText] = useState("");
  const [chosenUnit, setUnit] = useState(unit);
  const quantity = findUnit(unit)?.quantity;
  const units = UNITS.filter((candidate) => candidate.quantity === quantity);
  const value = Number(text.trim().replace(",", "."));
  const understood = text.trim() !== "" && Number.isFinite(value);
  return (
    <form
      className="grid gap-3"
      onSubmit={(event) => {
        event.preventDefault();
        if (understood) onAnswer({ kind: "number", value, unit: chosenUnit });
      }}
    >
      <div className="flex items-end gap-3">
        <TextField
          label="Value"
          inputMode="decimal"
          autoComplete="off"
          value={text}
          onChange={(event) => setText(event.target.value)}
          error={text.trim() !== "" && !understood ? "Write a number, like 0.05" : undefined}
          className="flex-1"
        />
        {units.length > 1 ? (
          <SelectField label="Unit" value={chosenUnit} onChange={(event) => setUnit(event.target.value)} className="w-28">
            {units.map((candidate) => (
              <option key={candidate.symbol}>{candidate.symbol}</option>
            ))}
          </SelectField>
        ) : (
          <span className="pb-2 font-mono text-[1.2rem]">{unit}</span>
        )}
      </div>
      <Button kind="main" type="submit" disabled={busy || !understood}>
        Answer
      </Button>
    </form>
  );
}

function OrderForm({ items, busy, onAnswer }: Part & { items: Item[] }) {
  const [order, setOrder] = useState(items);
  const move = (from: number, to: number) => {
    if (to < 0 || to >= order.length) return;
    const next = [...order];
    const [item] = next.splice(from, 1);
    if (item) next.splice(to, 0, item);
    setOrder(next);
  };
  return (
    <form
      className="grid gap-3"
      onSubmit={(event) => {
        event.preventDefault();
        onAnswer({ kind: "put_in_order", itemIds: order.map((item) => item.id) });
      }}
    >
      <ol className="grid gap-2" aria-label="In your order, first on top">
        {order.map((item, position) => (
          <li key={item.id} className="flex items-center gap-2 rounded border-[1.5px] border-steel bg-chalk pl-3">
            <span className="tabular w-6 font-mono text-ink2">{position + 1}</span>
            <span className="flex-1 py-2">{item.text}</span>
            <MoveButton label={`Move “${item.text}” up`} disabled={position === 0} onClick={() => move(position, position - 1)} sign="↑" />
            <MoveButton
              label={`Move “${item.text}” down`}
              disabled={position === order.length - 1}
              onClick={() => move(position, position + 1)}
              sign="↓"
            />
          </li>
        ))}
      </ol>
      <Button kind="main" type="submit" disabled={busy}>
        Answer
      </Button>
    </form>
  );
}

function MoveButton({ label, sign, disabled, onClick }: { label: string; sign: string; disabled: boolean; onClick: () => void }) {
  return (
    <button type="button" aria-label={label} disabled={disabled} onClick={onClick} className="size-12 border-l border-rule text-[1.3rem] disabled:opacity-30">
      {sign}
    </button>
  );
}
