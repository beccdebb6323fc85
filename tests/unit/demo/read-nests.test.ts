import { describe, expect, it } from 'vitest';
import { cellKey, ringOf } from '@/lib/comb/axial';
import { tallyOf } from '@/lib/comb/tally';
import { instantOf } from '@/lib/server/demo/build/demo-time';
import type { NestStory } from '@/lib/server/demo/story/nest-story';
import { RELEASES } from '@/lib/server/demo/tarrow/releases';
import { TARROW } from '@/lib/server/demo/tarrow/tarrow';
import { releaseNote } from '@/lib/server/demo/tarrow/take-down';
import { countsOf, opsOf, readingId, readingMarks } from './fold-ops';

/** The season's table: start, cells, egg, small, medium, large, capped, other, empty, nectar, comb, pedicel, °C, adults. */
const TABLE: readonly [string, string, string, ...unknown[]][] = [
  ['N01', 'take-down', '2026-05-21T07:10', 14, 10, 3, 0, 0, 0, {}, 1, 2, [24, 21], 9, 9, 1],
  ['N02', 'take-down', '2026-05-29T06:05', 19, 9, 5, 2, 0, 0, {}, 3, 3, [29, 25], 8, 11, 1],
  ['N03', 'take-down', '2026-06-02T19:40', 23, 9, 6, 3, 3, 0, {}, 2, 4, [33, 27], 7, 17, 1],
  ['N06', 'take-down', '2026-06-05T05:10', 34, 15, 8, 4, 4, 0, {}, 3, 5, [41, 34], 10, 12, 2],
  ['N09', 'take-down', '2026-06-09T05:50', 28, 9, 5, 3, 5, 2, { damaged: 3 }, 1, 1, [37, 30], 8, 13, 1],
  ['N11', 'take-down', '2026-06-12T06:20', 31, 10, 6, 4, 5, 4, {}, 2, 1, [39, 33], 11, 14, 1],
  ['N12', 'take-down', '2026-06-16T05:35', 33, 9, 6, 4, 6, 6, { parasitised: 1 }, 1, 0, [40, 35], 9, 15, 1],
  ['N10', 'lab', '2026-06-18T10:30', 29, 6, 0, 0, 0, 5, { dead: 12 }, 6, 0, [38, 31], 8, undefined, 0],
];

const ops = opsOf(TARROW);

function storyOf(code: string): NestStory {
  const story = TARROW.nests.find((nest) => nest.code === code);
  if (!story) throw new Error(`no nest ${code}`);
  return story;
}

function visitField(code: string, visitKey: string, name: string): unknown {
  const visit = storyOf(code).visits.find(({ key }) => key === visitKey);
  return visit?.acts.find(({ kind, body }) => kind === 'field.set' && body.field === name)?.body.value;
}

describe.each(TABLE)('nest %s', (...entry) => {
  const [code, visitKey, start, ...row] = entry;
  const [cells, egg, small, medium, large, capped, other, empty, nectarCells, comb, pedicel, temperature, adults] = row;
  const marks = readingMarks(ops, readingId(code, visitKey, 'field'));

  it('holds exactly the counts of the season’s table', () => {
    const { cellsTotal, ...counts } = { ...tallyOf(marks) };
    const none = { opened: 0, dead: 0, parasitised: 0, webbed: 0, damaged: 0, unread: 0 };
    expect(cellsTotal).toBe(cells);
    expect(counts).toEqual({ ...none, ...Object(other), egg, small, medium, large, capped, empty, nectarCells });
  });

  it('has states that sum to its cells, each address once', () => {
    const { cellsTotal, nectarCells: _apart, ...states } = tallyOf(marks);
    expect(Object.values(states).reduce((sum, count) => sum + count, 0)).toBe(cellsTotal);
    expect(new Set(marks.map(cellKey)).size).toBe(cellsTotal);
  });

  it('keeps nectar with eggs, small larvae or empty cells only', () => {
    const holders = marks.filter(({ nectar }) => nectar).map(({ state }) => state);
    expect(holders.filter((state) => !['egg', 'small', 'empty'].includes(state))).toEqual([]);
  });

  it('is the visit and the measures of the table', () => {
    const visit = storyOf(code).visits.find(({ key }) => key === visitKey);
    const measured = ['comb_max_mm', 'comb_min_mm', 'pedicel_mm', 'temp_c', 'adult_females'];
    expect(measured.map((name) => visitField(code, visitKey, name))).toEqual(
      [comb, pedicel, temperature, adults].flat(),
    );
    if (visitKey === 'take-down') expect(visit?.startedAt).toBe(start);
  });
});

describe('the readings of the season', () => {
  it('have the oldest brood nearest the pedicel and eggs further out', () => {
    for (const [code, visitKey] of TABLE) {
      const marks = readingMarks(ops, readingId(code, visitKey, 'field'));
      const meanRing = (states: readonly string[]) => {
        const rings = marks.filter(({ state }) => states.includes(state)).map(ringOf);
        return rings.reduce((sum, k) => sum + k, 0) / rings.length;
      };
      const oldest =
        ['capped', 'large', 'medium', 'small'].find((state) => marks.some((mark) => mark.state === state)) ?? '';
      expect(meanRing([oldest]), code).toBeLessThan(meanRing(['egg']));
    }
  });

  it('have a second reader who agrees on 18 of 19 cells of N02', () => {
    const field = readingMarks(ops, readingId('N02', 'take-down', 'field'));
    const second = new Map(
      readingMarks(ops, readingId('N02', 'take-down', 'second')).map((mark) => [cellKey(mark), mark.state]),
    );
    expect(second.size).toBe(19);
    expect(field.filter((mark) => second.get(cellKey(mark)) === mark.state)).toHaveLength(18);
  });

  it('keep both readings of N06: 12 cells on the phone, all 34 from the paper sheet', () => {
    const phone = countsOf(readingMarks(ops, readingId('N06', 'take-down', 'phone')));
    expect(phone).toMatchObject({ cellsTotal: 34, unread: 22 });
    expect(storyOf('N06').visits[0]?.readings.map(({ source, by }) => [source, by.name])).toEqual([
      ['phone', 'Oriel Webb-Nakada'],
      ['paper', 'Tobiah Marsh'],
    ]);
  });

  it('show 58 cells at N07 out of which six workers came', () => {
    const marks = readingMarks(ops, readingId('N07', 'reading', 'field'));
    expect(marks).toHaveLength(58);
    expect(marks.filter(({ state, reused }) => state === 'opened' || reused)).toHaveLength(6);
  });

  it('keep a corrected mark at N03 and a mark taken back at N11 in the history', () => {
    expect(ops.filter(({ kind, body }) => kind === 'cell.mark' && body.supersedes !== undefined)).toHaveLength(1);
    expect(ops.filter(({ kind }) => kind === 'cell.retract')).toHaveLength(1);
  });
});

describe('the release log', () => {
  it('gives the minutes from sunset of the season’s table', () => {
    const minutes = Object.entries(RELEASES).map(([code, release]) => [
      code,
      /^\d+ min (before|after)/.exec(releaseNote(release))?.[0],
    ]);
    expect(minutes).toEqual([
      ['N01', '16 min before'],
      ['N02', '12 min before'],
      ['N03', '5 min before'],
      ['N06', '5 min before'],
      ['N09', '7 min after'],
      ['N11', '12 min before'],
      ['N12', '7 min before'],
    ]);
  });

  it('says why the release of N09 was late', () => {
    expect(releaseNote(RELEASES.N09)).toContain('thunder');
  });

  it('puts every nest into its enclosure after its cells were read', () => {
    for (const [code, { enclosedAt }] of Object.entries(RELEASES)) {
      const reading = ops.filter(
        (op) => op.reading === readingId(code, 'take-down', 'field') && op.kind === 'cell.mark',
      );
      const lastRead = Math.max(...reading.map(({ at }) => Date.parse(at.wall)));
      expect(lastRead, code).toBeLessThan(instantOf(enclosedAt, TARROW.offset));
    }
  });
});
