"use client";

import { useState } from "react";
import { TextField } from "@/components/ui/field";

type ListEditorProps = { label: string; items: string[]; hint?: string; onChange: (items: string[]) => void };

/** Short things, one a line of text, parted by commas: tools, parts, codes. Kept when the field is left. */
export function ListEditor({ label, items, hint = "Parted by commas", onChange }: ListEditorProps) {
  const [text, setText] = useState(items.join(", "));
  return (
    <TextField
      label={label}
      hint={hint}
      value={text}
      onChange={(event) => setText(event.target.value)}
      onBlur={() => {
        const next = text
          .split(",")
          .map((item) => item.trim())
          .filter(Boolean);
        if (next.join("\n") !== items.join("\n")) onChange(next);
      }}
    />
  );
}
