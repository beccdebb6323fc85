'use client';

import { type ReactElement, type ReactNode, useState } from 'react';
import { FormTrouble } from '@/components/shell/account/form-trouble';
import { Button } from '@/components/ui/button';
import type { ButtonTone } from '@/components/ui/button-look';
import { Dialog } from '@/components/ui/dialog';
import { usePageAct } from './use-page-act';

interface ConfirmActProps {
  /** The button on the page, and what it is called for people who do not see its row. */
  words: string;
  label?: string;
  tone?: ButtonTone;
  title: string;
  /** What follows from it. */
  children: ReactNode;
  /** The button that does it. */
  act: string;
  path: string;
  /** Where to go afterwards; stays on the page when left out. */
  then?: string;
}

/** The keyboard goes to the page itself when the button that held it has gone from it. */
function backToPage(): void {
  document.getElementById('main')?.focus();
}

/** An act that ends something: asks once, says what follows, then does it. */
export function ConfirmAct({ words, label, tone, title, children, act, path, then }: ConfirmActProps): ReactElement {
  const [isOpen, setOpen] = useState(false);
  const { send, isSending, trouble } = usePageAct();
  const doIt = async (): Promise<void> => {
    const result = await send({ path, body: {} });
    if (!result.ok) return;
    if (then !== undefined) return window.location.assign(then);
    setOpen(false);
    backToPage();
  };
  return (
    <>
      <Button tone={tone} aria-label={label} onClick={() => setOpen(true)}>
        {words}
      </Button>
      <Dialog open={isOpen} onClose={() => setOpen(false)} title={title}>
        <div className="flex flex-col gap-3">
          {children}
          <FormTrouble words={trouble} />
          <div className="mt-2 flex flex-wrap gap-3">
            <Button tone="stop" disabled={isSending} onClick={() => void doIt()}>
              {act}
            </Button>
            <Button onClick={() => setOpen(false)}>Leave it</Button>
          </div>
        </div>
      </Dialog>
    </>
  );
}
