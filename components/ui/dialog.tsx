'use client';

import { type ReactElement, type ReactNode, useEffect, useId, useRef } from 'react';

interface DialogProps {
  open: boolean;
  title: string;
  /** Called when the person leaves by Escape or by the browser's own ways. */
  onClose: () => void;
  children: ReactNode;
}

/** A question over the page, on the browser's own dialog: focus stays inside and goes back where it was. */
export function Dialog({ open, title, onClose, children }: DialogProps): ReactElement {
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
      className="m-auto w-[min(34rem,calc(100vw-2rem))] rounded border-2 border-ink bg-paper p-5 text-ink backdrop:bg-shade/60"
    >
      <h2 id={heading} className="mb-3 text-xl font-bold">
        {title}
      </h2>
      {open && children}
    </dialog>
  );
}
