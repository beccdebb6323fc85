import { describe, expect, test } from 'vitest';
import { broodHistory } from '@/lib/offline/brood-history';
import { foldVisits } from '@/lib/offline/fold-visits';
import { type LocalOp, queuedOp } from '@/lib/offline/local-op';
import { ME, NEST, OTHER, id, op } from '@/tests/support/sim/local-ops';

const VISITS = [id(101), id(102), id(103)] as const;
let n = 0;

function row(kind: string, part: { visit: string; reading?: string; body?: object; actor?: string }): LocalOp {
  const { actor = ME, body, ...rest } = part;
  const made = op({ n: ++n, kind, nest: NEST, ...rest, body: { ...body } });
  return queuedOp(made, actor, n);
}

const visit = (index: 0 | 1 | 2) =>
  row('visit.open', {
    visit: VISITS[index],
    body: { purpose: 'check', startedAt: `2026-06-1${index}T08:00:00-04:00` },
  });
const reading = (index: 0 | 1 | 2, reading: string, part: { kind?: string; actor?: string; state?: string } = {}) => [
  row('reading.open', {
    visit: VISITS[index],
    reading,
    body: { kind: part.kind ?? 'field', source: 'phone' },
    actor: part.actor,
  }),
  row('cell.mark', {
    visit: VISITS[index],
    reading,
    body: { q: 0, r: 0, state: part.state ?? 'egg', nectar: false, unsure: false },
    actor: part.actor,
  }),
];

const historyOf = (rows: readonly LocalOp[], own: string) => broodHistory(foldVisits(rows, ME), own, rows);

describe('what a phone knows before a reading', () => {
  const [first, lab, mine] = [id(201), id(202), id(203)];

  test('is one reading of each earlier visit, dated by the visit, and nothing of its own visit', () => {
    const rows = [
      ...[visit(0), ...reading(0, first)],
      ...[visit(1), ...reading(1, lab, { kind: 'second', state: 'small' })],
      ...[visit(2), ...reading(2, mine), ...reading(2, id(204), { actor: OTHER, state: 'capped' })],
    ];
    const history = historyOf(rows, mine);
    expect(history?.earlier.map((each) => each.id)).toEqual([first, lab]);
    expect(history?.earlier[0]?.at).toBe(Date.parse('2026-06-10T08:00:00-04:00'));
    expect(history).toMatchObject({ visitAt: Date.parse('2026-06-12T08:00:00-04:00'), kind: 'field' });
  });

  test('prefers what was read at the nest to what was read in the lab', () => {
    const rows = [
      ...[visit(0), ...reading(0, lab, { kind: 'second', state: 'small' }), ...reading(0, first)],
      ...[visit(1), ...reading(1, mine)],
    ];
    expect(historyOf(rows, mine)?.earlier.map((each) => each.id)).toEqual([first]);
  });

  test('keeps from a second reader what is hidden from them, also at an earlier visit', () => {
    const rows = [
      ...[visit(0), ...reading(0, first, { actor: OTHER }), ...reading(0, lab, { kind: 'second' })],
      ...[visit(1), ...reading(1, mine)],
    ];
    expect(historyOf(rows, mine)?.earlier.map((each) => each.id)).toEqual([lab]);
  });

  test('is unknown for a reading that is not on the phone', () => {
    expect(historyOf([visit(0)], mine)).toBeNull();
  });
});
