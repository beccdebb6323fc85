import { createHash } from 'node:crypto';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import type * as estimateModule from '@/lib/brood/estimate-nest';
import type { BroodInput } from '@/lib/brood/input';
import type { CellState } from '@/lib/comb/states';
import { estimateAtHand } from '@/lib/server/queries/estimate-at-hand';

const made = vi.hoisted(() => ({ count: 0 }));

vi.mock('@/lib/brood/estimate-nest', async (load) => {
  const real = await load<typeof estimateModule>();
  const estimateNest = (input: BroodInput) => {
    made.count += 1;
    return real.estimateNest(input);
  };
  return { ...real, estimateNest };
});

const AT = Date.parse('2026-06-16T12:00:00Z');
const TARROW = { team: Buffer.alloc(16, 1) };
const OSSLE = { team: Buffer.alloc(16, 2) };
const digest = (text: string) => createHash('sha256').update(text).digest('hex');

function input(state: CellState, asOf = AT): BroodInput & { digest: (text: string) => string } {
  const readings = [{ id: 'r', at: AT - 3_600_000, marks: [{ q: 0, r: 0, state }] }];
  return { nest: 'n', zone: 'UTC', asOf, taxon: 'Polistes fuscatus', readings, digest };
}

const ask = (team: typeof TARROW, ...of: Parameters<typeof input>) => estimateAtHand(team, input(...of));

beforeEach(() => {
  made.count = 0;
});

describe('an estimate that was made already', () => {
  it('is given again for the same input on the same day, as of the moment that was asked for', () => {
    const first = ask(TARROW, 'egg');
    const later = ask(TARROW, 'egg', AT + 3_600_000);
    expect(made.count).toBe(1);
    expect(later).toEqual({ ...first, asOf: '2026-06-16T13:00:00.000Z' });
  });

  it('is made anew for another mark, another day and another team', () => {
    ask(TARROW, 'small');
    ask(TARROW, 'medium');
    ask(TARROW, 'small', AT + 86_400_000);
    ask(OSSLE, 'small');
    expect(made.count).toBe(4);
  });
});
