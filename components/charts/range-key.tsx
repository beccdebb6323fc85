import type { ReactElement } from 'react';

const SAMPLES = [
  ['50', 6.5],
  ['80', 3.5],
  ['95', 1.5],
] as const;

/** What the thickness of a range means, in words beside a sample of each. */
export function RangeKey(): ReactElement {
  return (
    <ul aria-label="How wide the ranges are" className="flex flex-wrap gap-x-5 gap-y-1 text-sm">
      {SAMPLES.map(([times, width]) => (
        <li key={times} className="flex items-center gap-1.5">
          <svg width="28" height="12" aria-hidden="true">
            <line x1="1" x2="27" y1="6" y2="6" stroke="var(--ink)" strokeWidth={width} />
          </svg>
          {times} times in 100
        </li>
      ))}
    </ul>
  );
}

/** What the parts of a strip mean. */
export function StripKey(): ReactElement {
  return (
    <ul aria-label="What the strips mean" className="flex flex-wrap gap-x-5 gap-y-1 text-sm">
      <li className="flex items-center gap-1.5">
        <svg width="28" height="14" aria-hidden="true">
          <rect x="1" y="1" width="26" height="12" fill="var(--stage-small)" stroke="var(--ink)" />
        </svg>
        egg and larva
      </li>
      <li className="flex items-center gap-1.5">
        <svg width="28" height="14" aria-hidden="true">
          <rect x="1" y="1" width="26" height="12" fill="var(--fig-capped)" stroke="var(--ink)" />
        </svg>
        capped
      </li>
      <li>line above: range of capping; lines below: laying (left) and the day the adult comes out (right)</li>
    </ul>
  );
}
