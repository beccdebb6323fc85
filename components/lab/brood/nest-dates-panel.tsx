'use client';

import type { ReactElement } from 'react';
import { Figure, type FigureFacts } from '@/components/charts/figure';
import { type NestDate, NestDatesDrawing } from '@/components/charts/nest-dates-drawing';
import { RangeKey } from '@/components/charts/range-key';

interface NestDatesPanelProps {
  dates: readonly NestDate[];
  visits: readonly string[];
  asOf: string;
  facts: FigureFacts;
}

/** Founding, first adult and readings of the nest on one line of days. */
export function NestDatesPanel({ dates, visits, asOf, facts }: NestDatesPanelProps): ReactElement | null {
  if (dates.length === 0) return null;
  return (
    <div className="mt-4">
      <Figure
        label="Ranges of the nest's own dates; the words above hold the same."
        facts={facts}
        draw={(width) => <NestDatesDrawing dates={dates} visits={visits} asOf={asOf} width={width} />}
      />
      <RangeKey />
    </div>
  );
}
