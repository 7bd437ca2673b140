"use client";

import { useState } from "react";
import { TextArea } from "@/components/ui/field";

type ListEditorProps = { label: string; items: string[]; hint?: string; onChange: (items: string[]) => void };

const itemsOf = (text: string): string[] =>
  text
    .split("\n")
    .map((item) => item.trim())
    .filter(Boolean);

/** Short things, one on each line: tools, parts, codes. */
export function ListEditor({ label, items, hint, onChange }: ListEditorProps) {
  const [text, setText] = useState(items.join("\n"));
  // Undone, joined or loaded anew: what is typed follows.
  const joined = items.join("\n");
  if (itemsOf(text).join("\n") !== joined && text !== joined) setText(joined);
  return (
    <TextArea
      label={label}
      hint={hint ?? "One on each line"}
      rows={Math.max(2, items.length + 1)}
      value={text}
      onChange={(event) => {
        setText(event.target.value);
        onChange(itemsOf(event.target.value));
      }}
    />
  );
}
