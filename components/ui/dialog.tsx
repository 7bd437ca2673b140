"use client";

import { useEffect, useRef, type ReactNode } from "react";

type DialogProps = { open: boolean; onClose: () => void; title: string; children: ReactNode };

/** A modal of the browser's own: focus is held and given back, Escape closes it. */
export function Dialog({ open, onClose, title, children }: DialogProps) {
  const ref = useRef<HTMLDialogElement>(null);
  useEffect(() => {
    const dialog = ref.current;
    if (open && !dialog?.open) dialog?.showModal();
    if (!open && dialog?.open) dialog.close();
  }, [open]);
  return (
    <dialog
      ref={ref}
      onClose={onClose}
      aria-label={title}
      className="m-auto max-h-[90dvh] w-[min(40rem,94vw)] overflow-auto rounded border border-steel bg-sheet p-5 text-ink backdrop:bg-film/60"
    >
      <div className="mb-3 flex items-start justify-between gap-4">
        <h2 className="text-[1.5rem] leading-tight">{title}</h2>
        <button type="button" onClick={onClose} className="min-h-11 min-w-11 font-plate text-[1.1rem] font-semibold text-strong underline underline-offset-4">
          Close
        </button>
      </div>
      {open && children}
    </dialog>
  );
}
