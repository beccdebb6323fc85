import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { checkLines, hitWords, lostWords, seenWords } from '@/components/lab/brood/check-words';
import { anyChecks, ChecksTable, HitsTable } from '@/components/lab/brood/checks-tables';
import type { CheckedRange, EventCounts, EventSeen } from '@/lib/brood/what-happened';

const range: [string, string] = ['2026-06-05', '2026-06-12'];
const spread = { median: '2026-06-09', p50: range, p80: range, p95: range };
const check = (q: number, r: number, seen: EventSeen): CheckedRange => ({
  q,
  r,
  event: 'capped',
  predicted: { ...spread, utc: spread },
  seen,
  lookedUntil: '2026-06-15',
});
const none = { n: 0, inside: 0, either: 0 };

describe('how ranges held, in words', () => {
  it('is a count out of those that had run out, or from how many to how many', () => {
    expect(hitWords({ n: 9, inside: 6, either: 0 })).toBe('6 of 9');
    expect(hitWords({ n: 9, inside: 5, either: 2 })).toBe('5 to 7 of 9');
    expect(hitWords(none)).toBe('none has run out yet');
  });

  it('says what was seen since as days, never as a likeliest day', () => {
    expect(seenWords({ kind: 'between', from: '2026-06-08', to: '2026-06-15' }, '2026-06-15', '2026')).toBe(
      'between 8 and 15 June',
    );
    expect(seenWords({ kind: 'not-yet' }, '2026-06-15', '2026')).toBe('not yet on 15 June');
    expect(seenWords({ kind: 'lost' }, '2026-06-15', '2026')).toBe('cannot be told: the brood was gone');
  });

  it('puts cells with the same range and the same sight on one line', () => {
    const lines = checkLines([
      check(1, 0, { kind: 'not-yet' }),
      check(0, 0, { kind: 'not-yet' }),
      check(0, 1, { kind: 'lost' }),
    ]);
    expect(lines.map(({ cells }) => cells)).toEqual([[0, 3], [4]]);
    const html = renderToStaticMarkup(<ChecksTable checks={[check(0, 0, { kind: 'not-yet' })]} year="2026" />);
    expect(html).toContain('between 5 and 12 June');
  });

  it('tells cells that are left out, and a visit with nothing to hold against', () => {
    const counts: EventCounts[] = [{ event: 'capped', p50: none, p80: none, p95: none, lost: 2 }];
    expect(lostWords(counts)).toBe('2 cells left out: the brood was gone before.');
    const visit = { key: 'v', label: 'Check, 10 June', counts };
    expect(anyChecks([visit])).toBe(true);
    expect(anyChecks([{ ...visit, counts: [] }])).toBe(false);
    expect(renderToStaticMarkup(<HitsTable visits={[visit]} />)).toContain('Check, 10 June');
  });
});
