import type { ReactElement } from 'react';

/** The mark: a slanted roof line, one short stalk, one cell below. */
export function RoofMark({ size = 40 }: { size?: number }): ReactElement {
  return (
    <svg width={size} height={size} viewBox="0 0 48 48" aria-hidden="true" className="shrink-0">
      <path d="M5 13L43 5" fill="none" stroke="var(--main)" strokeWidth="5" />
      <path d="M24 9v10" fill="none" stroke="currentColor" strokeWidth="4" />
      <polygon points="24,19 35,25.3 35,38 24,44.3 13,38 13,25.3" fill="none" stroke="currentColor" strokeWidth="4" />
    </svg>
  );
}
