import type { ReactElement } from 'react';
import { isNestState, NEST_STATE_WORDS, type NestState } from './lab-words';

const FILLED: Readonly<Record<NestState, number>> = {
  new: 0,
  reading: 0.3,
  submitted: 0.55,
  settled: 0.8,
  locked: 1,
  archived: 0,
};

/** How far a nest is, in words, with a small cell that fills as the work gets on. */
export function StateWord({ state }: { state: string }): ReactElement {
  if (!isNestState(state)) return <>{state}</>;
  const top = 2 + 20 * (1 - FILLED[state]);
  return (
    <span className="inline-flex items-baseline gap-1.5">
      <svg width="13" height="15" viewBox="0 0 22 24" aria-hidden="true" className="shrink-0 translate-y-0.5 text-main">
        <svg y={top} width="22" height={24 - top} viewBox={`0 ${top} 22 ${24 - top}`}>
          <polygon points="11,2 20,7 20,17 11,22 2,17 2,7" fill="currentColor" />
        </svg>
        <polygon
          points="11,2 20,7 20,17 11,22 2,17 2,7"
          fill="none"
          stroke="currentColor"
          strokeWidth="2"
          strokeDasharray={state === 'archived' ? '3 3' : undefined}
        />
      </svg>
      {NEST_STATE_WORDS[state]}
    </span>
  );
}
