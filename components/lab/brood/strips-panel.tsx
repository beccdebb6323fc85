'use client';

import { type ReactElement, useState } from 'react';
import { Figure, type FigureFacts } from '@/components/charts/figure';
import { RangeKey, StripKey } from '@/components/charts/range-key';
import { StripsDrawing } from '@/components/charts/strips-drawing';
import type { BroodRow } from '@/components/lab/brood-rows';
import { BroodTable } from '@/components/lab/brood-table';
import { Button } from '@/components/ui/button';
import { countWords } from '@/components/ui/date-words';
import { Disclosure } from '@/components/ui/disclosure';
import { isStripSort, STRIP_SORTS, stripOf, stripRows, type StripSort } from './strip-rows';

interface StripsPanelProps {
  rows: readonly BroodRow[];
  /** The local day the estimate speaks for. */
  asOf: string;
  facts: FigureFacts;
}

/** Strips drawn at once: more of them would be neither readable nor quick. */
const AT_ONCE = 60;

interface OrderProps {
  sort: StripSort;
  grouped: boolean;
  onSort: (sort: StripSort) => void;
  onGrouped: (grouped: boolean) => void;
}

function Order({ sort, grouped, onSort, onGrouped }: OrderProps): ReactElement {
  return (
    <div className="print-hidden mb-3 flex flex-wrap items-center gap-x-6 gap-y-2">
      <label className="flex items-center gap-2">
        Order
        <select
          value={sort}
          onChange={(event) => isStripSort(event.target.value) && onSort(event.target.value)}
          className="min-h-9 rounded border-2 border-edge bg-paper px-2"
        >
          {Object.entries(STRIP_SORTS).map(([key, words]) => (
            <option key={key} value={key}>
              {words}
            </option>
          ))}
        </select>
      </label>
      <label className="flex min-h-9 items-center gap-2">
        <input
          type="checkbox"
          checked={grouped}
          onChange={(event) => onGrouped(event.target.checked)}
          className="size-5 accent-[var(--main)]"
        />
        Cells with equal dates together
      </label>
    </div>
  );
}

interface PagesProps {
  from: number;
  count: number;
  onFrom: (from: number) => void;
}

/** Steps through more strips than are drawn at once. */
function Pages({ from, count, onFrom }: PagesProps): ReactElement | null {
  if (count <= AT_ONCE) return null;
  const to = Math.min(count, from + AT_ONCE);
  return (
    <div className="mt-2 flex flex-wrap items-center gap-3">
      <span role="status">
        Strips {from + 1} to {to} of {count}
      </span>
      <Button className="print-hidden" aria-disabled={from === 0} onClick={() => from > 0 && onFrom(from - AT_ONCE)}>
        Strips before
      </Button>
      <Button className="print-hidden" aria-disabled={to === count} onClick={() => to < count && onFrom(to)}>
        Strips after
      </Button>
    </div>
  );
}

/** A strip for every brood: when it was laid, is capped and comes out, in an order of choice. */
export function StripsPanel({ rows, asOf, facts }: StripsPanelProps): ReactElement {
  const [sort, setSort] = useState<StripSort>('laid');
  const [grouped, setGrouped] = useState(true);
  const [from, setFrom] = useState(0);
  const all = stripRows(rows, { sort, grouped });
  const start = from < all.length ? from : 0;
  const shown = all.slice(start, start + AT_ONCE);
  const anew = (change: () => void): void => {
    change();
    setFrom(0);
  };
  if (rows.length === 0) return <p className="text-quiet">No cell of this comb holds brood that can be dated.</p>;
  return (
    <>
      <Order
        sort={sort}
        grouped={grouped}
        onSort={(next) => anew(() => setSort(next))}
        onGrouped={(next) => anew(() => setGrouped(next))}
      />
      <Figure
        label={`${countWords(shown.length, 'brood strip')}, ${STRIP_SORTS[sort]}; the table below holds the same dates.`}
        facts={facts}
        draw={(width) => <StripsDrawing strips={shown.map(stripOf)} asOf={asOf} width={width} />}
      />
      <Pages from={start} count={all.length} onFrom={setFrom} />
      <div className="mt-2 flex flex-col gap-1">
        <StripKey />
        <RangeKey />
      </div>
      <Disclosure summary="The same dates as a table" className="print-hidden mt-2">
        <BroodTable rows={shown} inYear={asOf} />
      </Disclosure>
    </>
  );
}
