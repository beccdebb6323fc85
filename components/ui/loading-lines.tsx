import type { ReactElement } from 'react';

const WIDTHS = ['w-11/12', 'w-3/4', 'w-5/6', 'w-2/3', 'w-4/5'] as const;

interface LoadingLinesProps {
  /** What is being fetched: `Nests`. */
  what: string;
  lines?: number;
}

/** Still grey lines while something is fetched; nothing flickers or runs. */
export function LoadingLines({ what, lines = 5 }: LoadingLinesProps): ReactElement {
  return (
    <div role="status" aria-busy="true" className="flex flex-col gap-3 py-4">
      <p className="text-quiet">{what}: fetching …</p>
      {Array.from({ length: lines }, (_, index) => (
        <div key={index} aria-hidden="true" className={`h-4 rounded bg-wash ${WIDTHS[index % WIDTHS.length]}`} />
      ))}
    </div>
  );
}
