'use client';

import { useEffect, useState } from 'react';
import { type ExpectedStates, NOTHING_EXPECTED } from '@/components/field/recorder/expected-states';
import { usePerson } from '@/components/field/parts/person-context';
import { DEFAULT_DURATIONS, durationsFor } from '@/lib/brood/durations';
import { expectedToday } from '@/lib/brood/expected-today';
import type { StageDays } from '@/lib/brood/stage-places';
import { cellKey } from '@/lib/comb/axial';
import { askBrood } from '@/lib/offline/browser-brood';
import type { BroodHistory } from '@/lib/offline/brood-history';
import { useBroodHistory } from '@/lib/offline/hooks/use-brood-history';
import type { RecorderView } from '@/lib/offline/recorder-view';
import { afterPaint } from './after-paint';

/** What a comb is expected to hold today, and what changes are judged by. */
export interface Expectation {
  states: ExpectedStates;
  /** `second-reading`: nothing but the comb may lead it; `no-estimate`: this phone could not make one. */
  standing: 'computing' | 'ready' | 'second-reading' | 'no-estimate';
  durations: StageDays;
  /** Days since the last visit with a reading; null at the first. */
  daysSince: number | null;
}

const DAY_MS = 86_400_000;

interface Known {
  reading: string;
  states: ExpectedStates;
  failed: boolean;
}

function standingOf(history: BroodHistory | null | undefined, known: Known | null): Expectation['standing'] {
  if (history === null || known?.failed) return 'no-estimate';
  if (history?.kind === 'second') return 'second-reading';
  return known ? 'ready' : 'computing';
}

/**
 * What the last visits let one expect in the cells today. Nothing at a first reading, and nothing in a second one, which
 * must not be led by anything but the comb. Worked out beside the main thread; until it has come, nothing is expected.
 */
export function useExpectation({ nest, reading }: RecorderView, taxon: string | null): Expectation {
  const { zone } = usePerson();
  const history = useBroodHistory(nest, reading);
  const [known, setKnown] = useState<Known | null>(null);
  useEffect(() => {
    if (!history || history.kind === 'second' || history.earlier.length === 0) return;
    let current = true;
    const { visitAt, earlier } = history;
    const ask = (): void =>
      void askBrood({ nest, zone, taxon, asOf: visitAt, readings: earlier }).then(
        (estimate) => {
          const cells = expectedToday(estimate, earlier);
          const states = new Map(cells.map((cell) => [cellKey(cell), cell.state]));
          if (current) setKnown({ reading, states, failed: false });
        },
        // Without an estimate the recorder works as at a first reading.
        () => current && setKnown({ reading, states: NOTHING_EXPECTED, failed: true }),
      );
    const withdraw = afterPaint(ask);
    return () => {
      current = false;
      withdraw();
    };
  }, [history, nest, reading, taxon, zone]);
  const own = known?.reading === reading ? known : null;
  const lastAt = history?.earlier.at(-1)?.at;
  return {
    states: own?.states ?? NOTHING_EXPECTED,
    standing: standingOf(history, own),
    durations: durationsFor(taxon, DEFAULT_DURATIONS).row,
    daysSince: history && lastAt !== undefined ? Math.max(0, (history.visitAt - lastAt) / DAY_MS) : null,
  };
}
