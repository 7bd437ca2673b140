"use client";

import { useState } from "react";
import { TextField } from "@/components/ui/field";

type PasswordFieldProps = { name: string; label: string; kind: "old" | "new"; error?: string | undefined; hint?: string; defaultValue?: string };

/** A password that can be shown while it is typed: long ones are not typed blind, least of all on a phone. */
export function PasswordField({ name, label, kind, error, hint, defaultValue }: PasswordFieldProps) {
  const [shown, setShown] = useState(false);
  return (
    <div className="grid gap-1">
      <TextField
        name={name}
        label={label}
        type={shown ? "text" : "password"}
        autoComplete={kind === "new" ? "new-password" : "current-password"}
        autoCapitalize="none"
        spellCheck={false}
        required
        error={error}
        {...(hint ? { hint } : {})}
        {...(defaultValue === undefined ? {} : { defaultValue })}
      />
      <label className="flex min-h-11 w-fit items-center gap-3 text-ink2">
        <input type="checkbox" checked={shown} onChange={(event) => setShown(event.target.checked)} className="size-5 accent-(--strong)" />
        Show the password
      </label>
    </div>
  );
}
