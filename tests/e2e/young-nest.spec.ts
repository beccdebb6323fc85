import { expect, test } from '@playwright/test';
import type { BroodEstimate } from '@/lib/brood/answer';
import { spiral } from '@/lib/comb/walk';
import { freshIds, markOp, openingOps } from '@/tests/support/wire/first-visit';
import { WireClient } from '@/tests/support/wire/wire-client';
import { origin } from '@/tests/support/running-server';

/**
 * The one dated count of a young nest found in print: seen on 6 June with 26 cells, 15 eggs, 11 larvae, nothing
 * capped (an old nature story, one nest, read at second hand; the dates are derived from 11/20/14 days). The split of
 * the 11 larvae into 5 small, 3 medium and 3 large is invented.
 */
const STATES = ['large', 'medium', 'small', 'egg'].flatMap((state, index) =>
  Array<string>([3, 3, 5, 15][index] ?? 0).fill(state),
);
const PUBLISHED = {
  oldestEggLaid: ['2026-05-06', '2026-05-26'],
  firstEmergence: ['2026-06-20', '2026-07-10'],
} as const;

function overlaps(
  [from, to]: readonly [string, string],
  [publishedFrom, publishedTo]: readonly [string, string],
): boolean {
  return from <= publishedTo && publishedFrom <= to;
}

test('the published young nest is read in, synced, dated within the published ranges, and exported', async () => {
  const technician = new WireClient(origin());
  await technician.signIn('technician@tarrow.example');
  await technician.enrol();
  const ids = freshIds();
  const cells = spiral(STATES.length).map((cell, index) => markOp(ids, { ...cell, state: STATES[index] ?? 'unread' }));
  const pushed = await technician.push([...openingOps(ids, 'YOUNG-26', '2026-06-06T10:00:00-04:00'), ...cells]);
  expect(pushed.results.every(({ r }) => r === 'applied')).toBe(true);

  const brood = await technician.get<BroodEstimate>(`/api/nests/${ids.nest}/brood?asOf=2026-06-06T20:00:00Z`);
  const laid = brood.cells.map((cell) => cell.laid?.p95).filter((range) => range !== undefined);
  expect(laid).toHaveLength(26);
  const oldest = brood.cells.find(({ q, r }) => q === 0 && r === 0)?.laid?.p95 ?? ['', ''];
  expect(overlaps(oldest, PUBLISHED.oldestEggLaid), `oldest egg laid ${oldest.join(' to ')}`).toBe(true);
  const first = brood.nest.firstEmergence?.p95 ?? ['', ''];
  expect(overlaps(first, PUBLISHED.firstEmergence), `first emergence ${first.join(' to ')}`).toBe(true);

  const reviewer = new WireClient(origin());
  await reviewer.signIn('reviewer@tarrow.example');
  const tallies = await (await reviewer.fetch('/api/export/tallies.csv?nest=YOUNG-26')).text();
  const [, row = ''] = tallies.split('\r\n');
  expect(row.split(',').slice(8)).toEqual(['26', '0', '15', '5', '3', '3', '0', '0', '0', '0', '0', '0', '0', '0', '']);
});
