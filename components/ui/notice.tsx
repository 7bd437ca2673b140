import type { ReactNode } from "react";

type NoticeProps = { kind?: "info" | "error" | "done"; title: ReactNode; children?: ReactNode };

const EDGE = { info: "border-l-steel", error: "border-l-paint", done: "border-l-strong" };

/** What happened, what is safe, what to do. Errors are read out at once, the rest when there is time. */
export function Notice({ kind = "info", title, children }: NoticeProps) {
  return (
    <div role={kind === "error" ? "alert" : "status"} className={`rounded border border-rule border-l-[6px] bg-chalk px-4 py-3 ${EDGE[kind]}`}>
      <p className="font-semibold">{title}</p>
      {children && <div className="mt-1 text-ink2">{children}</div>}
    </div>
  );
}

/** An empty place says what belongs there and holds the button that puts it there. */
export function EmptyPlace({ title, children, action }: { title: string; children?: ReactNode; action?: ReactNode }) {
  return (
    <div className="grid justify-items-start gap-3 rounded border-[1.5px] border-dashed border-steel px-5 py-8">
      <p className="font-plate text-[1.4rem] font-semibold leading-tight">{title}</p>
      {children && <div className="max-w-[60ch] text-ink2">{children}</div>}
      {action}
    </div>
  );
}
