import { describe, expect, it } from 'vitest';
import { censusOf } from '@/lib/server/queries/census';
import { nestState } from '@/lib/server/queries/nest-state';
import type { ReadingRow } from '@/lib/server/queries/reading-rows';

let made = 0;

function reading(kind: string, more: Partial<ReadingRow> = {}): ReadingRow {
  made += 1;
  const id = Buffer.alloc(16);
  id.writeUInt32BE(made, 12);
  return {
    team_id: Buffer.alloc(16),
    id,
    nest_id: Buffer.alloc(16),
    visit_id: Buffer.alloc(16),
    kind,
    source: 'phone',
    aid: null,
    light: null,
    opened_by: Buffer.alloc(16),
    opened_at: new Date(1_000),
    opened_at_text: '',
    submitted_at: new Date(2_000),
    based_on: null,
    base_seq: null,
    version: null,
    locked_version: null,
    ...more,
  };
}

const OPEN = { submitted_at: null };

describe('censusOf', () => {
  it('prefers the final reading to the field one and that to the second', () => {
    const [final, field, second] = [reading('final', { version: 1 }), reading('field'), reading('second')];
    expect(censusOf([second, field, final])).toBe(final);
    expect(censusOf([second, field])).toBe(field);
    expect(censusOf([second])).toBe(second);
    expect(censusOf([])).toBeNull();
  });

  it('of several of one kind prefers the locked, then a submitted, then the latest', () => {
    const early = reading('field');
    const late = reading('field', { opened_at: new Date(5_000) });
    const open = reading('field', { opened_at: new Date(9_000), ...OPEN });
    expect(censusOf([early, open, late])).toBe(late);
    const locked = reading('final', { version: 2, locked_version: 1 });
    expect(censusOf([reading('final', { version: 1, opened_at: new Date(9_000) }), locked])).toBe(locked);
  });

  it('decides the same whatever order they come in', () => {
    const same = [reading('field'), reading('field'), reading('field')];
    expect(censusOf(same)).toBe(censusOf([...same].reverse()));
  });
});

describe('nestState', () => {
  it.each<[string, ReadingRow[]]>([
    ['new', []],
    ['reading', [reading('field', OPEN)]],
    ['reading', [reading('field'), reading('second', OPEN)]],
    ['submitted', [reading('field'), reading('second')]],
    ['settled', [reading('field', OPEN), reading('final', { version: 1 })]],
    ['settled', [reading('field'), reading('final', { version: 2, locked_version: 1 })]],
    ['locked', [reading('field'), reading('final', { version: 2, locked_version: 2 })]],
  ])('is %s', (state, readings) => {
    expect(nestState(null, readings)).toBe(state);
    expect(nestState(new Date(0), readings)).toBe('archived');
  });
});
