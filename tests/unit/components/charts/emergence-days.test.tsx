import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { busyDays, emergenceWords } from '@/components/charts/emergence-days';
import { EmergenceDrawing } from '@/components/charts/emergence-drawing';
import { EmergenceTable } from '@/components/charts/emergence-table';

const day = (date: string, expected: number, hi80 = 0) => ({ date, expected, lo80: 0, hi80 });
const quiet = day('2026-06-16', 0.001);
const days = [
  quiet,
  day('2026-06-17', 0.4, 1),
  day('2026-06-18', 1.8, 3),
  day('2026-06-19', 0),
  day('2026-06-20', 0.8, 2),
];

describe('the days worth drawing', () => {
  it('run from the first to the last on which anything is expected, quiet ones between kept', () => {
    expect(busyDays([...days, quiet]).map(({ date }) => date)).toEqual([
      '2026-06-17',
      '2026-06-18',
      '2026-06-19',
      '2026-06-20',
    ]);
    expect(busyDays([quiet])).toEqual([]);
  });
});

describe('the chart of adults per day', () => {
  it('says in words how many, and the days of the middle half as a range', () => {
    expect(emergenceWords(days)).toBe(
      'About 3 adults are expected in the days shown, half of them between 18 and 20 June.',
    );
  });

  it('draws one bar a day under an axis that holds the ranges', () => {
    const html = renderToStaticMarkup(<EmergenceDrawing days={busyDays(days)} asOf="2026-06-16" width={600} />);
    expect(html.match(/fig-capped/g)).toHaveLength(4);
    expect(html).toContain('>5<');
    expect(html).toContain('viewBox="0 0 600 198"');
  });

  it('draws nothing without days', () => {
    expect(renderToStaticMarkup(<EmergenceDrawing days={[]} asOf="2026-06-16" width={600} />)).toBe('');
  });

  it('stands beside a table with the same numbers', () => {
    const html = renderToStaticMarkup(<EmergenceTable days={days} inYear="2026" />);
    expect(html.match(/<tr/g)).toHaveLength(6);
    expect(html).toContain('1.80');
  });
});
