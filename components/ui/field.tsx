import { useId, type InputHTMLAttributes, type ReactNode, type SelectHTMLAttributes, type TextareaHTMLAttributes } from "react";

const CONTROL =
  "min-h-11 w-full rounded border-[1.5px] border-steel bg-chalk px-3 py-2 text-ink disabled:opacity-60 aria-invalid:border-paint-text";

type Shared = { label: ReactNode; hint?: ReactNode; error?: string | undefined; className?: string };

/** Label above, hint below, error below that; all tied to the control for screen readers. */
function Field({ id, label, hint, error, className = "", children }: Shared & { id: string; children: ReactNode }) {
  return (
    <div className={`grid gap-1 ${className}`}>
      <label htmlFor={id} className="font-plate text-[1.1rem] font-semibold">
        {label}
      </label>
      {children}
      {hint && (
        <p id={`${id}-hint`} className="text-sm text-ink2">
          {hint}
        </p>
      )}
      {error && (
        <p id={`${id}-error`} className="text-sm font-semibold text-paint-text" role="alert">
          {error}
        </p>
      )}
    </div>
  );
}

const described = (id: string, hint: unknown, error: unknown) => ({
  "aria-describedby": [hint ? `${id}-hint` : "", error ? `${id}-error` : ""].filter(Boolean).join(" ") || undefined,
  "aria-invalid": error ? true : undefined,
});

type TextFieldProps = Shared & Omit<InputHTMLAttributes<HTMLInputElement>, "className">;

/** One line of text; give `type` and `inputMode` for numbers, days, addresses. */
export function TextField({ label, hint, error, className, ...input }: TextFieldProps) {
  const made = useId();
  const id = input.id ?? made;
  return (
    <Field id={id} label={label} hint={hint} error={error} {...(className ? { className } : {})}>
      <input {...input} id={id} className={CONTROL} {...described(id, hint, error)} />
    </Field>
  );
}

type TextAreaProps = Shared & Omit<TextareaHTMLAttributes<HTMLTextAreaElement>, "className">;

export function TextArea({ label, hint, error, className, ...input }: TextAreaProps) {
  const made = useId();
  const id = input.id ?? made;
  return (
    <Field id={id} label={label} hint={hint} error={error} {...(className ? { className } : {})}>
      <textarea rows={3} {...input} id={id} className={CONTROL} {...described(id, hint, error)} />
    </Field>
  );
}

type SelectFieldProps = Shared & Omit<SelectHTMLAttributes<HTMLSelectElement>, "className">;

export function SelectField({ label, hint, error, className, children, ...select }: SelectFieldProps) {
  const made = useId();
  const id = select.id ?? made;
  return (
    <Field id={id} label={label} hint={hint} error={error} {...(className ? { className } : {})}>
      <select {...select} id={id} className={CONTROL} {...described(id, hint, error)}>
        {children}
      </select>
    </Field>
  );
}

type CheckboxProps = Omit<InputHTMLAttributes<HTMLInputElement>, "className" | "type"> & { label: ReactNode; hint?: ReactNode };

/** A box to tick; the whole line is the target. */
export function Checkbox({ label, hint, ...input }: CheckboxProps) {
  return (
    <label className="flex min-h-11 items-start gap-3 py-2">
      <input type="checkbox" {...input} className="mt-0.5 size-6 shrink-0 accent-(--strong)" />
      <span>
        {label}
        {hint && <span className="block text-sm text-ink2">{hint}</span>}
      </span>
    </label>
  );
}

type RadioProps = Omit<InputHTMLAttributes<HTMLInputElement>, "className" | "type"> & { label: ReactNode; name: string };

/** One of several, framed; the whole frame is the target. Stands in a fieldset whose legend asks. */
export function Radio({ label, ...input }: RadioProps) {
  return (
    <label className="flex min-h-12 items-center gap-3 rounded border-[1.5px] border-steel bg-chalk px-3 py-2 has-checked:border-strong has-checked:bg-tint has-checked:font-semibold has-disabled:border-rule has-disabled:bg-transparent has-disabled:text-ink2">
      <input type="radio" {...input} className="size-5 shrink-0 accent-(--strong)" />
      <span className="min-w-0">{label}</span>
    </label>
  );
}
