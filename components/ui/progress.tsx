type ProgressProps = { label: string; percent: number; detail?: string };

/** Long work with how far it is; `detail` says how much time is left. */
export function Progress({ label, percent, detail }: ProgressProps) {
  const shown = Math.max(0, Math.min(100, Math.round(percent)));
  return (
    <div className="grid gap-1">
      <div className="flex justify-between gap-3 text-sm">
        <span>{label}</span>
        <span className="tabular font-mono text-ink2">{detail ?? `${shown} %`}</span>
      </div>
      <div role="progressbar" aria-label={label} aria-valuenow={shown} aria-valuemin={0} aria-valuemax={100} className="h-3 rounded border border-steel bg-chalk">
        <div className="h-full bg-strong" style={{ width: `${shown}%` }} />
      </div>
    </div>
  );
}
