import { describe, expect, it } from 'vitest';
import { cellsOf, estimate, reading } from './support';

const DAY_MS = 86_400_000;

/** The gate so many days before the median first emergence of a nest. */
function gateAhead(days: number) {
  const seen = reading('2026-05-25T16:00:00Z', cellsOf({ large: 1, egg: 4 }));
  const due = Date.parse(estimate([seen]).nest.firstEmergence?.utc.median ?? '');
  return estimate([seen], { asOf: due - days * DAY_MS });
}

describe('the season gate (programme default: amber in the last 7 days, red from the first worker on)', () => {
  it.each([
    [15, 'green'],
    [8, 'green'],
    [7, 'amber'],
    [1, 'amber'],
    [0, 'red'],
    [-3, 'red'],
  ])('%d days before first emergence is %s', (days, season) => {
    expect(gateAhead(days).nest.season).toBe(season);
  });

  it('asks for the lead biologist when a capped nest is within three days', () => {
    const seen = reading('2026-06-10T16:00:00Z', cellsOf({ capped: 1 }));
    const due = Date.parse(estimate([seen]).nest.firstEmergence?.utc.median ?? '');
    const codes = (days: number) => estimate([seen], { asOf: due - days * DAY_MS }).flags.map(({ code }) => code);
    expect(codes(3)).toEqual(['guard']);
    expect(codes(5)).toEqual([]);
  });
});
