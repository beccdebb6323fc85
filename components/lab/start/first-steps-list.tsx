import type { ReactElement } from 'react';
import { LinkButton } from '@/components/ui/link-button';
import type { FirstStep, StepState } from './first-steps';

const STATE_WORDS: Readonly<Record<StepState, string>> = {
  done: 'done',
  now: 'now',
  waiting: 'waiting for an answer',
  later: 'to come',
};

/** A cell of a comb for each step: filled when done, drawn heavily when it is the one to take. */
function StepCell({ number, state }: { number: number; state: StepState }): ReactElement {
  const isDone = state === 'done';
  const width = state === 'now' ? 4.5 : 2.5;
  return (
    <svg width="40" height="44" viewBox="0 0 48 52" aria-hidden="true" className="shrink-0 text-main">
      <polygon
        points="24,2 45,14 45,38 24,50 3,38 3,14"
        fill={isDone ? 'currentColor' : 'none'}
        stroke="currentColor"
        strokeWidth={width}
        strokeDasharray={state === 'later' ? '5 4' : undefined}
      />
      <text
        x="24"
        y="33"
        textAnchor="middle"
        fontSize="20"
        fontWeight="bold"
        fill={isDone ? 'var(--on-main)' : 'var(--ink)'}
      >
        {isDone ? '✓' : number}
      </text>
    </svg>
  );
}

/** The way to a first dated nest, step by step. */
export function FirstStepsList({ steps }: { steps: readonly FirstStep[] }): ReactElement {
  return (
    <ol className="flex max-w-[46rem] flex-col">
      {steps.map(({ key, title, state, has, how, way }, index) => (
        <li
          key={key}
          aria-current={state === 'now' ? 'step' : undefined}
          className="flex gap-4 border-b border-rule py-4 first:border-t"
        >
          <StepCell number={index + 1} state={state} />
          <div className="min-w-0 grow">
            <div className="flex flex-wrap items-baseline gap-x-3">
              <h2 className="text-lg font-bold">{title}</h2>
              <p className={`text-sm ${state === 'now' ? 'font-bold text-main' : 'text-quiet'}`}>
                {STATE_WORDS[state]}
                {has && `: ${has}`}
              </p>
            </div>
            <p className="mt-1">{how}</p>
            {way && (
              <LinkButton href={way.href} tone={state === 'now' ? 'main' : 'plain'} className="mt-3">
                {way.words}
              </LinkButton>
            )}
          </div>
        </li>
      ))}
    </ol>
  );
}
