'use client';

import type { ReactElement } from 'react';
import { EmergenceDrawing } from '@/components/charts/emergence-drawing';
import type { EmergenceDay } from '@/components/charts/emergence-day';
import { emergenceWords } from '@/components/charts/emergence-days';
import { EmergenceTable } from '@/components/charts/emergence-table';
import { Figure, type FigureFacts } from '@/components/charts/figure';
import { Disclosure } from '@/components/ui/disclosure';

interface PerDayPanelProps {
  days: readonly EmergenceDay[];
  asOf: string;
  facts: FigureFacts;
}

/** Adults expected per day, drawn and as numbers. */
export function PerDayPanel({ days, asOf, facts }: PerDayPanelProps): ReactElement {
  const words = emergenceWords(days);
  return (
    <>
      <Figure
        label={words}
        facts={facts}
        draw={(width) => <EmergenceDrawing days={days} asOf={asOf} width={width} />}
      />
      <p className="mt-2 text-quiet">{words} The band around each day’s bar is its range, 8 times in 10.</p>
      <Disclosure summary="The same numbers as a table" className="print-hidden mt-2">
        <EmergenceTable days={days} inYear={asOf} />
      </Disclosure>
    </>
  );
}
