import { describe, expect, test } from 'vitest';
import type { BroodEstimate } from '@/lib/brood/answer';
import { expectedToday } from '@/lib/brood/expected-today';
import { estimateNest } from '@/lib/brood/estimate-nest';
import type { BroodReading } from '@/lib/brood/input';
import type { CellState } from '@/lib/comb/states';
import { spiral } from '@/lib/comb/walk';

const SEEN_AT = Date.parse('2026-06-16T12:00:00Z');
const DAY = 86_400_000;
const STATES: readonly CellState[] = ['capped', 'large', 'medium', 'small', 'egg', 'empty', 'opened', 'dead', 'unread'];

const reading = (states: readonly CellState[], at = SEEN_AT): BroodReading => ({
  id: `r-${at}`,
  at,
  marks: spiral(states.length).map((cell, index) => ({ ...cell, state: states[index] ?? 'unread' })),
});

function expected(readings: readonly BroodReading[], days: number): (CellState | undefined)[] {
  const asOf = SEEN_AT + days * DAY;
  const estimate = estimateNest({ nest: 'n', zone: 'America/New_York', asOf, readings, taxon: 'Polistes fuscatus' });
  const cells = expectedToday(estimate, readings);
  return spiral(STATES.length).map(({ q, r }) => cells.find((cell) => cell.q === q && cell.r === r)?.state);
}

describe('what a cell is expected to hold', () => {
  test('on the day it was read is what was read; nothing for a cell nobody looked into', () => {
    expect(expected([reading(STATES)], 0)).toEqual([...STATES.slice(0, -1), undefined]);
  });

  test('a day later is the same', () => {
    expect(expected([reading(STATES)], 1)).toEqual([...STATES.slice(0, -1), undefined]);
  });

  // Rabb 1960 (Ann Entomol Soc Am 53:111-121) prints 11, 20 and 14 days for egg, larva and capped brood.
  test('after the whole of the capped time is an opened cell, and an egg has become a larva', () => {
    // One nest each: neighbours of other ages say something about the pace of a nest.
    const [capped, large, egg, empty] = (['capped', 'large', 'egg', 'empty'] as const).map(
      (state) => expected([reading([state])], 14)[0],
    );
    expect(capped).toBe('opened');
    expect(large).toBe('capped');
    expect(['small', 'medium']).toContain(egg);
    expect(empty).toBe('empty');
  });

  test('never goes back with the days', () => {
    const order: readonly CellState[] = ['egg', 'small', 'medium', 'large', 'capped', 'opened'];
    let before = -1;
    for (let days = 0; days <= 60; days += 5) {
      const now = order.indexOf(expected([reading(['egg'])], days)[0] ?? 'egg');
      expect(now).toBeGreaterThanOrEqual(before);
      before = now;
    }
    expect(before).toBe(order.length - 1);
  });

  test('stays what was seen for a while, even where the dates put the brood further on', () => {
    const readings = [reading(['small'])];
    const asOf = SEEN_AT + DAY / 2;
    const made = estimateNest({ nest: 'n', zone: 'UTC', asOf, readings, taxon: 'Polistes fuscatus' });
    const on = (days: number) => {
      const median = new Date(SEEN_AT + days * DAY).toISOString();
      const spread = { median, p50: [median, median], p80: [median, median], p95: [median, median] } as const;
      return { ...spread, utc: spread };
    };
    // 25 days old: by Rabb 1960 a medium larva, which was read as a small one.
    const [cell] = made.cells;
    const dates = { laid: on(-25), capped: on(6), emerges: { ...on(20), probability: 1 } };
    const estimate = { ...made, cells: [{ ...cell, ...dates }] } as unknown as BroodEstimate;
    expect(expectedToday(estimate, readings).map(({ state }) => state)).toEqual(['small']);
  });

  test('starts from the last look, not from an unread later one', () => {
    const later = reading(
      STATES.map(() => 'unread' as const),
      SEEN_AT + DAY,
    );
    expect(expected([reading(STATES), later], 2)[0]).toBe('capped');
  });

  test('takes no notice of what was read after the day it speaks for', () => {
    const later = reading(
      STATES.map(() => 'dead' as const),
      SEEN_AT + 5 * DAY,
    );
    expect(expected([reading(STATES), later], 1)[4]).toBe('egg');
  });
});
