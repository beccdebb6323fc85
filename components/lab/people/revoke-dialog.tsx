'use client';

import { type FormEvent, type ReactElement, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { Input } from '@/components/ui/input';
import { usePageAct } from './use-page-act';
import { phoneName, unsentWarning } from './phone-words';
import type { PhoneView } from './phone-words';

/** Withdraws a phone, with the reason, after saying what goes with it. */
export function RevokeDialog({ phone }: { phone: PhoneView }): ReactElement {
  const [isOpen, setOpen] = useState(false);
  const [reason, setReason] = useState('');
  const { send, isSending, trouble, setTrouble } = usePageAct();
  const revoke = async (event: FormEvent): Promise<void> => {
    event.preventDefault();
    if (reason.trim() === '') return setTrouble('Say why: lost, stolen, broken, handed in.');
    const result = await send({ path: `/api/devices/${phone.id}/revoke`, body: { reason: reason.trim() } });
    if (!result.ok) return;
    setOpen(false);
    document.getElementById('main')?.focus();
  };
  return (
    <>
      <Button aria-label={`Withdraw ${phoneName(phone)}`} onClick={() => setOpen(true)}>
        Withdraw
      </Button>
      <Dialog open={isOpen} onClose={() => setOpen(false)} title={`Withdraw ${phoneName(phone)}?`}>
        <form onSubmit={(event) => void revoke(event)} className="flex flex-col gap-3">
          <p>Its next request is refused. This cannot be undone: a phone that turns up again is enrolled anew.</p>
          <p>{unsentWarning(phone.unsent)}</p>
          <Field id={`reason-${phone.id}`} label="Reason" required error={trouble}>
            {(control) => (
              <Input {...control} maxLength={200} value={reason} onChange={(event) => setReason(event.target.value)} />
            )}
          </Field>
          <div className="mt-2 flex flex-wrap gap-3">
            <Button type="submit" tone="stop" disabled={isSending}>
              {isSending ? 'Withdrawing …' : 'Withdraw it'}
            </Button>
            <Button onClick={() => setOpen(false)}>Leave it</Button>
          </div>
        </form>
      </Dialog>
    </>
  );
}
