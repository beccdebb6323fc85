import type { ReactElement } from 'react';

interface MarkProps {
  /** Edge of the square it is drawn in, in CSS pixels. */
  size?: number;
  className?: string;
}

/** The mark: a slanted roof line, one short stalk, one hexagon below. */
export function Mark({ size = 34, className = '' }: MarkProps): ReactElement {
  return (
    <svg width={size} height={size} viewBox="0 0 64 64" aria-hidden="true" className={`shrink-0 ${className}`}>
      <path d="M32 14V27" stroke="var(--ink)" strokeWidth="4" />
      <path d="M6 19L58 7" stroke="var(--main)" strokeWidth="7" />
      <polygon
        points="32,26 46.7,34.5 46.7,51.5 32,60 17.3,51.5 17.3,34.5"
        fill="var(--paper)"
        stroke="var(--ink)"
        strokeWidth="4.5"
        strokeLinejoin="round"
      />
    </svg>
  );
}
