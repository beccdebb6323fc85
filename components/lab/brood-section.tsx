import type { ReactElement } from 'react';
import { type BroodStrip, BroodStrips, BroodStripsKey } from '@/components/charts/brood-strips';
import { busyDays, EmergenceDays, emergenceWords } from '@/components/charts/emergence-days';
import { EmergenceTable } from '@/components/charts/emergence-table';
import { CellGlyph } from '@/components/comb/cell-glyph';
import { runWords } from '@/components/ui/date-words';
import { Disclosure } from '@/components/ui/disclosure';
import { Section } from '@/components/ui/section';
import type { BroodEstimate } from '@/lib/brood/answer';
import { type BroodRow, broodRows } from './brood-rows';
import { BroodTable } from './brood-table';

interface BroodSectionProps {
  estimate: BroodEstimate;
  /** The local day the estimate speaks for. */
  asOf: string;
}

/** The cells of a strip: their symbol and numbers. */
function StripLabel({ row: { state, cells } }: { row: BroodRow }): ReactElement {
  return (
    <span className="flex min-w-0 items-center gap-1.5 pr-2 text-sm">
      <CellGlyph state={state} size={20} />
      <span className="truncate">
        {cells.length === 1 ? 'cell' : 'cells'} <span className="font-mono">{runWords(cells)}</span>
      </span>
    </span>
  );
}

function stripOf(row: BroodRow): BroodStrip {
  const { cells, laid, capped, emerges } = row;
  return {
    key: cells.join(),
    label: <StripLabel row={row} />,
    laid: { median: laid.median, range: laid.p80 },
    capped: capped?.median ?? null,
    emerges: emerges && { median: emerges.median, range: emerges.p80 },
  };
}

/** The brood of a nest, cell by cell and day by day, each chart with its dates in words one tap away. */
export function BroodSection({ estimate, asOf }: BroodSectionProps): ReactElement {
  const rows = broodRows(estimate.cells);
  const days = busyDays(estimate.nest.emergencePerDay);
  return (
    <>
      <Section id="brood" title="Brood, oldest first" className="mt-8">
        {rows.length === 0 ? (
          <p className="text-quiet">No cell of this comb holds brood that can be dated.</p>
        ) : (
          <>
            <BroodStrips strips={rows.map(stripOf)} asOf={asOf} />
            <BroodStripsKey />
            <Disclosure summary="The same dates as a table" className="mt-2">
              <BroodTable rows={rows} inYear={asOf} />
            </Disclosure>
          </>
        )}
      </Section>
      {days.length > 0 && (
        <Section id="per-day" title="Adults expected per day" className="mt-8">
          <EmergenceDays days={days} />
          <p className="mt-2 text-quiet">
            {emergenceWords(days)} The band around each day’s bar is its range, 8 times in 10.
          </p>
          <Disclosure summary="The same numbers as a table" className="mt-2">
            <EmergenceTable days={days} inYear={asOf} />
          </Disclosure>
        </Section>
      )}
    </>
  );
}
