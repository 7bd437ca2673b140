"use client";

import { useState } from "react";
import { TextField } from "@/components/ui/field";

type NumberFieldProps = { label: string; value: number | null; min?: number; onChange: (value: number | null) => void; hint?: string };

/** A number as people type it, with point or comma; null where it is none yet. */
export function NumberField({ label, value, min, onChange, hint }: NumberFieldProps) {
  const known = value === null || Number.isNaN(value) ? null : value;
  const shown = known === null ? "" : String(known);
  const [text, setText] = useState(shown);
  const read = readNumber(text, min);
  // Undone or changed elsewhere: what is typed follows.
  if (read !== known && text !== shown) setText(shown);
  return (
    <TextField
      label={label}
      hint={hint}
      inputMode="decimal"
      autoComplete="off"
      value={text}
      error={text.trim() !== "" && read === null ? "Give a number." : undefined}
      onChange={(event) => {
        setText(event.target.value);
        onChange(readNumber(event.target.value, min));
      }}
    />
  );
}

function readNumber(text: string, min = -Infinity): number | null {
  if (!/^\s*[-−]?\d{1,9}(?:[.,]\d{0,6})?\s*$/.test(text)) return null;
  const value = Number(text.replace(",", ".").replace("−", "-"));
  return value >= min ? value : null;
}
