import type { ReactElement } from 'react';

const BANDS = ['under 7', '7–13', '14–20', '21–27', '28–34', '35–41', '42 and more'] as const;

/** What the fills of the comb mean, youngest first. The days also stand in the cells. */
export function AgeKey(): ReactElement {
  return (
    <div className="mt-3 text-sm">
      <p className="text-quiet">The number in a cell: days since the egg was most likely laid.</p>
      <ul aria-label="Days since the egg was laid" className="print-hidden mt-1 flex flex-wrap gap-x-3 gap-y-1">
        {BANDS.map((words, band) => (
          <li key={words} className="flex items-center gap-1.5">
            <svg width="18" height="18" viewBox="0 0 48 48" aria-hidden="true" className={`comb-cell age-${band}`}>
              <polygon className="comb-wall" points="24,2 43,13 43,35 24,46 5,35 5,13" />
            </svg>
            {words}
          </li>
        ))}
      </ul>
    </div>
  );
}
