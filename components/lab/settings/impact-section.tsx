import type { ReactElement } from 'react';
import { Button } from '@/components/ui/button';
import { countWords } from '@/components/ui/date-words';
import { Notice } from '@/components/ui/notice';
import { Section } from '@/components/ui/section';
import { BodyCell, HeadCell, Table } from '@/components/ui/table';
import type { DateShift } from '@/lib/brood/team-settings/date-shift';
import type { NestShiftView } from './settings-shapes';
import { type Impact, useImpact } from './use-impact';

/** How far the likeliest day moves; the day itself is never shown without its range. `3 days later`, `1 day earlier`, `stays`. */
export function shiftWords({ before, after, days }: DateShift): string {
  if (before === null && after === null) return 'no date';
  if (days === null) return after === null ? 'loses its date' : 'gets a date';
  if (days === 0) return 'stays';
  return `${countWords(Math.abs(days), 'day')} ${days > 0 ? 'later' : 'earlier'}`;
}

function ShiftCell({ shift }: { shift: DateShift }): ReactElement {
  return <BodyCell className={shift.days ? 'font-bold' : ''}>{shiftWords(shift)}</BodyCell>;
}

/** Nests that move first, the furthest first. */
function byMove(nests: readonly NestShiftView[]): NestShiftView[] {
  const size = ({ founded, firstEmergence }: NestShiftView) =>
    Math.max(Math.abs(founded.days ?? 0), Math.abs(firstEmergence.days ?? 0));
  return [...nests].sort((a, b) => size(b) - size(a) || (a.code < b.code ? -1 : 1));
}

function ImpactTable({ nests }: { nests: readonly NestShiftView[] }): ReactElement {
  return (
    <Table scrolls caption="How far the dates of each nest would move" className="sm:max-w-2xl">
      <thead>
        <tr>
          <HeadCell>Nest</HeadCell>
          <HeadCell>Founded</HeadCell>
          <HeadCell>First adult</HeadCell>
        </tr>
      </thead>
      <tbody>
        {byMove(nests).map(({ id, code, founded, firstEmergence }) => (
          <tr key={id}>
            <BodyCell className="font-mono">{code}</BodyCell>
            <ShiftCell shift={founded} />
            <ShiftCell shift={firstEmergence} />
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

function ImpactProgress({ state, looked, total }: Impact): ReactElement | null {
  if (state === 'not-asked') return null;
  const words =
    state === 'looking' ? `${looked} of ${total || '…'} nests looked at` : `${countWords(looked, 'nest')} looked at`;
  return (
    <div className="my-2">
      <p role="status">{words}</p>
      {state === 'looking' && (
        <progress
          value={looked}
          max={total || 1}
          aria-label="Nests looked at"
          className="w-full max-w-md accent-main"
        />
      )}
    </div>
  );
}

/** Shows which nests' dates the saved draft would move, and by how much, before anybody signs. */
export function ImpactSection({ canLook }: { canLook: boolean }): ReactElement {
  const impact = useImpact();
  const { state, nests, trouble, look } = impact;
  return (
    <Section id="impact" title="What would move" className="mt-8">
      <Button onClick={look} disabled={!canLook || state === 'looking'}>
        {state === 'not-asked' ? 'Show which dates would move' : 'Look again'}
      </Button>
      {!canLook && <p className="mt-1 text-sm text-quiet">Save the draft first.</p>}
      <ImpactProgress {...impact} />
      {trouble && (
        <Notice tone="stop" live="assertive" className="my-3">
          <p>{trouble}</p>
        </Notice>
      )}
      {nests.length > 0 && <ImpactTable nests={nests} />}
    </Section>
  );
}
