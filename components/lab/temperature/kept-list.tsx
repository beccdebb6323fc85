'use client';

import { type ReactElement, useState } from 'react';
import { Button } from '@/components/ui/button';
import { countWords, dateWords, dayWords, momentWords } from '@/components/ui/date-words';
import { Dialog } from '@/components/ui/dialog';
import { Field } from '@/components/ui/field';
import { TextArea } from '@/components/ui/input';
import { localDate } from '@/lib/kit/local-date';
import { keptName } from './kept-name';
import type { KeptView } from './temperature-shapes';
import { useKeep } from '@/components/lab/use-keep';

interface KeptListProps {
  nest: string;
  records: readonly KeptView[];
  zone: string;
  inYear: string;
  /** May the person who looks take records out? */
  mayWrite: boolean;
}

/** Asks for the reason, then takes a record out of force. */
function TakeOut({ nest, record }: { nest: string; record: KeptView }): ReactElement {
  const [isOpen, setOpen] = useState(false);
  const [reason, setReason] = useState('');
  const { send, isSending, trouble } = useKeep(() => setOpen(false));
  const path = `/api/nests/${nest}/temperature/${record.id}/remove`;
  return (
    <>
      <Button tone="quiet" onClick={() => setOpen(true)}>
        Take out <span className="sr-only">{keptName(record)}</span>
      </Button>
      <Dialog open={isOpen} onClose={() => setOpen(false)} title={`Take out ${keptName(record)}?`}>
        <p className="mb-3">It then changes no date any more. It stays on file with the reason.</p>
        <Field id={`reason-${record.id}`} label="Reason" error={trouble} required>
          {(control) => <TextArea {...control} value={reason} onChange={(event) => setReason(event.target.value)} />}
        </Field>
        <div className="mt-5 flex flex-wrap gap-3">
          <Button
            tone="stop"
            disabled={isSending || reason.trim() === ''}
            onClick={() => send({ method: 'POST', path, body: { reason: reason.trim() } })}
          >
            {isSending ? 'Taking out …' : 'Take it out'}
          </Button>
          <Button onClick={() => setOpen(false)}>Leave it in</Button>
        </div>
      </Dialog>
    </>
  );
}

/** The days a record speaks for. */
function spanOf({ from, to }: KeptView, zone: string, inYear: string): string {
  const [first, last] = [localDate(Date.parse(from), zone), localDate(Date.parse(to) - 1, zone)];
  return last <= first ? dateWords(first, inYear) : `${dateWords(first, inYear)} to ${dateWords(last, inYear)}`;
}

/** Every record kept for a nest, those taken out at the end. */
export function KeptList({ nest, records, zone, inYear, mayWrite }: KeptListProps): ReactElement | null {
  if (records.length === 0) return null;
  const inForce = records.filter(({ removed }) => !removed);
  const out = records.filter(({ removed }) => removed);
  return (
    <ul className="flex flex-col gap-2">
      {[...inForce, ...out].map((record) => (
        <li key={record.id} className="keep-together border-b border-rule pb-2">
          <div className="flex flex-wrap items-baseline justify-between gap-x-3">
            <p className={record.removed ? 'text-quiet' : ''}>
              <a href={`/api/nests/${nest}/temperature/${record.id}`} className="font-bold text-main underline">
                {keptName(record)}
              </a>
              , {countWords(record.size, record.kind === 'logger' ? 'reading' : 'day')}, {spanOf(record, zone, inYear)}
            </p>
            {mayWrite && !record.removed && <TakeOut nest={nest} record={record} />}
          </div>
          <p className="text-sm text-quiet">
            Kept by {record.keptBy}, {momentWords(record.keptAt, zone, inYear)}
          </p>
          {record.removed && (
            <p className="text-sm [overflow-wrap:anywhere]">
              Taken out by {record.removed.by}, {dayWords(record.removed.at, zone, inYear)}: {record.removed.reason}
            </p>
          )}
        </li>
      ))}
    </ul>
  );
}
