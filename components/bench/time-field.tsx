"use client";

import { useState } from "react";
import { TextField } from "@/components/ui/field";
import { formatTimestamp } from "@/lib/core/webvtt/timestamps";

/** A time as it is typed: "83.5", "1:23.5", "0:01:23.5". @returns whole ms, or null */
export function readTime(text: string): number | null {
  const match = /^(?:(?:(\d{1,2}):)?(\d{1,3}):)?(\d{1,5})(?:[.,](\d{1,3}))?$/.exec(text.trim());
  if (!match) return null;
  const [, hours = "0", minutes = "0", seconds = "0", fraction = ""] = match;
  return ((Number(hours) * 60 + Number(minutes)) * 60 + Number(seconds)) * 1000 + Number(fraction.padEnd(3, "0"));
}

/** A time on the bench: without hours where there are none. */
export const shortTime = (ms: number): string => formatTimestamp(ms).replace(/^00:/, "");

type TimeFieldProps = { label: string; ms: number; onChange: (ms: number) => void; className?: string };

/** A time that can be typed; taken when the field is left or Enter is pressed. */
export function TimeField({ label, ms, onChange, className }: TimeFieldProps) {
  const [text, setText] = useState<string | null>(null);
  const read = text === null ? ms : readTime(text);
  const take = () => {
    if (read !== null && read !== ms) onChange(read);
    setText(null);
  };
  return (
    <TextField
      label={label}
      inputMode="decimal"
      autoComplete="off"
      value={text ?? shortTime(ms)}
      error={read === null ? "Like 1:23.5" : undefined}
      onChange={(event) => setText(event.target.value)}
      onBlur={take}
      onKeyDown={(event) => event.key === "Enter" && take()}
      {...(className ? { className } : {})}
    />
  );
}
