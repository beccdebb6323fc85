import type { ReactElement, ReactNode } from 'react';
import { CellGlyph } from '@/components/comb/cell-glyph';
import { momentWords } from '@/components/ui/date-words';
import { STATE_WORDS } from '@/lib/comb/states';
import { cellNumber } from '@/lib/comb/walk';
import { type Decision, decisionHistory } from './decision-history';
import type { ReviewView } from './lab-shapes';

interface HistoryListProps {
  review: Pick<ReviewView, 'settlements' | 'amendments'>;
  zone: string;
  year: string;
}

interface EntryProps {
  glyph?: ReactNode;
  what: string;
  who: string;
  reason: string;
}

function Entry({ glyph, what, who, reason }: EntryProps): ReactElement {
  return (
    <li className="keep-together flex gap-2">
      <span className="w-7 shrink-0">{glyph}</span>
      <div className="min-w-0">
        <p>
          <span className="font-bold">{what}</span>
          <span className="text-quiet">, {who}</span>
        </p>
        <p className="[overflow-wrap:anywhere] whitespace-pre-line">{reason}</p>
      </div>
    </li>
  );
}

/** A decision in words; `when` puts its instant into words. */
function entryOf(decision: Decision, when: (at: string) => string): EntryProps & { key: string } {
  if (decision.kind === 'amended') {
    const { version, actor, at, reason } = decision.amendment;
    return { key: `version ${version}`, what: `Version ${version} opened`, who: `${actor}, ${when(at)}`, reason };
  }
  const { settlement } = decision;
  return {
    key: `${settlement.at} ${cellNumber(settlement)}`,
    glyph: <CellGlyph state={settlement.state} size={26} />,
    what: `Cell ${cellNumber(settlement)}: ${STATE_WORDS[settlement.state]}`,
    who: `${settlement.actor}, ${when(settlement.at)}, version ${settlement.version}`,
    reason: settlement.reason,
  };
}

/** Who settled which cell as what, who opened a new version, when and why; newest first. The marks stay as they are. */
export function HistoryList({ review, zone, year }: HistoryListProps): ReactElement {
  const decisions = decisionHistory(review);
  if (decisions.length === 0) return <p className="text-quiet">No cell was settled otherwise than it was marked.</p>;
  return (
    <ol className="flex flex-col gap-3">
      {decisions.map((decision) => {
        const { key, ...entry } = entryOf(decision, (at) => momentWords(at, zone, year));
        return <Entry key={key} {...entry} />;
      })}
    </ol>
  );
}
