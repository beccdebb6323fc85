'use client';

import { type ReactElement, type ReactNode, useEffect, useId, useRef } from 'react';

interface SheetProps {
  open: boolean;
  title: string;
  /** Called when the person leaves by the Close key, by Escape or by the browser's own ways. */
  onClose: () => void;
  children: ReactNode;
}

/** A panel from the lower edge, within reach of a thumb; in the middle of a wide page. It does not slide. */
export function Sheet({ open, title, onClose, children }: SheetProps): ReactElement {
  const dialog = useRef<HTMLDialogElement>(null);
  const heading = useId();
  useEffect(() => {
    const element = dialog.current;
    if (!element || element.open === open) return;
    if (open) element.showModal();
    else element.close();
  }, [open]);
  return (
    <dialog
      ref={dialog}
      aria-labelledby={heading}
      onClose={onClose}
      className="m-auto mb-0 max-h-[92dvh] w-full max-w-[40rem] overflow-y-auto rounded-t-xl border-3 border-ink bg-paper p-gap text-field text-ink backdrop:bg-shade/60 lg:mb-auto lg:rounded-xl"
    >
      <div className="mb-4 flex items-center justify-between gap-gap">
        <h2 id={heading} className="text-2xl font-bold">
          {title}
        </h2>
        <button
          type="button"
          onClick={onClose}
          className="min-h-field min-w-field shrink-0 rounded-xl border-3 border-ink px-4 font-bold"
        >
          Close
        </button>
      </div>
      {open && children}
    </dialog>
  );
}
