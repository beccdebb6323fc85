'use client';

import { useRouter } from 'next/navigation';
import { type ReactElement, useOptimistic, useTransition } from 'react';
import Link from 'next/link';
import { buttonLook } from '@/components/ui/button-look';
import { type BroodStop, stopHref } from './brood-stops';

interface VisitStepperProps {
  nest: string;
  stops: readonly Pick<BroodStop, 'key' | 'label'>[];
  /** Which of them is shown. */
  at: number;
}

interface StepLinkProps {
  nest: string;
  stop: Pick<BroodStop, 'key' | 'label'> | undefined;
  children: string;
}

/** One visit back or on; in its place, grey, where there is none. Works without script. */
function StepLink({ nest, stop, children }: StepLinkProps): ReactElement {
  if (!stop) {
    return (
      <span aria-hidden="true" className={buttonLook('plain', 'lab', 'border-rule text-quiet')}>
        {children}
      </span>
    );
  }
  return (
    <Link href={stopHref(nest, stop.key)} scroll={false} className={buttonLook('plain', 'lab')}>
      {children}
      <span className="sr-only">: {stop.label}</span>
    </Link>
  );
}

/** Walks through the visits: what was known at each. The page stays where it is while another is fetched. */
export function VisitStepper({ nest, stops, at }: VisitStepperProps): ReactElement {
  const router = useRouter();
  const [isFetching, startFetching] = useTransition();
  const [place, setPlace] = useOptimistic(at);
  const go = (to: number): void => {
    const stop = stops[to];
    if (!stop) return;
    startFetching(() => {
      setPlace(to);
      router.replace(stopHref(nest, stop.key), { scroll: false });
    });
  };
  const label = stops[place]?.label ?? '';
  return (
    <div role="group" aria-label="As known then" className="mb-6 border-y border-ink py-3">
      <p className="mb-1">
        <span className="text-quiet">As known at </span>
        <strong>{label}</strong>
        <span role="status" className="ml-3 text-quiet">
          {isFetching && 'fetching …'}
        </span>
      </p>
      {stops.length > 1 && (
        <div className="print-hidden flex items-center gap-3">
          <StepLink nest={nest} stop={stops[at - 1]}>
            Earlier
          </StepLink>
          <input
            type="range"
            min={0}
            max={stops.length - 1}
            step={1}
            value={place}
            aria-label="Visit"
            aria-valuetext={`${place + 1} of ${stops.length}: ${label}`}
            onChange={(event) => go(Number(event.target.value))}
            className="h-9 min-w-0 flex-1 accent-[var(--main)]"
          />
          <StepLink nest={nest} stop={stops[at + 1]}>
            Later
          </StepLink>
        </div>
      )}
    </div>
  );
}
