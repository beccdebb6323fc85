import type { ReactElement } from 'react';
import type { Tally } from '@/lib/comb/tally';
import { tallyWords } from './comb-view';

interface TallyLineProps {
  tally: Tally;
  className?: string;
}

/** A tally in words on one line that may wrap between its parts: `33 cells: 6 capped, 6 large, …`. */
export function TallyLine({ tally, className = '' }: TallyLineProps): ReactElement {
  const cells = `${tally.cellsTotal} ${tally.cellsTotal === 1 ? 'cell' : 'cells'}`;
  const words = tallyWords(tally);
  return (
    <p className={`tally-line ${className}`}>
      <strong>{cells}</strong>
      {words.map((word) => (
        <span key={word} className="whitespace-nowrap">
          {word}
        </span>
      ))}
    </p>
  );
}
