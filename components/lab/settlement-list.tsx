import type { ReactElement } from 'react';
import { CellGlyph } from '@/components/comb/cell-glyph';
import { momentWords } from '@/components/ui/date-words';
import { STATE_WORDS } from '@/lib/comb/states';
import { cellNumber } from '@/lib/comb/walk';
import type { SettlementView } from './lab-shapes';

interface SettlementListProps {
  settlements: readonly SettlementView[];
  zone: string;
  year: string;
}

/** Who settled which cell, as what, when and why; newest first. The observer's own marks stay as they are. */
export function SettlementList({ settlements, zone, year }: SettlementListProps): ReactElement {
  if (settlements.length === 0) return <p className="text-quiet">No cell was settled otherwise than it was marked.</p>;
  const newestFirst = [...settlements].sort((a, b) => Date.parse(b.at) - Date.parse(a.at));
  return (
    <ol className="flex flex-col gap-3">
      {newestFirst.map((settlement) => (
        <li key={`${settlement.at}${settlement.q},${settlement.r}`} className="keep-together flex gap-2">
          <CellGlyph state={settlement.state} size={26} />
          <div className="min-w-0">
            <p>
              <span className="font-bold">
                Cell {cellNumber(settlement)}: {STATE_WORDS[settlement.state]}
              </span>
              <span className="text-quiet">
                , {settlement.actor}, {momentWords(settlement.at, zone, year)}, version {settlement.version}
              </span>
            </p>
            <p className="[overflow-wrap:anywhere] whitespace-pre-line">{settlement.reason}</p>
          </div>
        </li>
      ))}
    </ol>
  );
}
