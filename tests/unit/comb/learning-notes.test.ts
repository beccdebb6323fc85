import { describe, expect, it } from 'vitest';
import { learningNotes } from '@/lib/comb/learning-notes';
import { CELL_STATES, type CellState } from '@/lib/comb/states';
import { N12 } from '@/tests/support/n12';

function cells(read: CellState, settled: CellState, count: number) {
  return Array.from({ length: count }, () => ({ read, settled }));
}

describe('learning notes', () => {
  it('say how often, of how many, and what to look for', () => {
    const { notes } = learningNotes([...cells('capped', 'large', 2), ...cells('large', 'large', 6)]);
    expect(notes.map(({ words }) => words)).toEqual([
      'You read 2 of 8 large larvae as capped. As long as a pale face with dark jaws shows, she is a large larva; a capped cell is closed all round.',
    ]);
  });

  it('count what stood first: of N12 31 of 33, with two things to look for', () => {
    const summary = learningNotes(N12.map(({ field, final }) => ({ read: field, settled: final })));
    expect([summary.cells, summary.stood]).toEqual([33, 31]);
    expect(summary.notes.map(({ read, settled, count, of }) => [read, settled, count, of])).toEqual([
      ['medium', 'large', 1, 7],
      ['empty', 'egg', 1, 10],
    ]);
  });

  it('leave out cells that either side could not read', () => {
    expect(learningNotes([...cells('unread', 'egg', 3), ...cells('egg', 'unread', 2)])).toEqual({
      cells: 0,
      stood: 0,
      notes: [],
    });
  });

  it('are at most five, the commonest first', () => {
    const many = (['egg', 'small', 'medium', 'large', 'capped', 'dead', 'webbed'] as const).flatMap((read, at) =>
      cells(read, 'opened', at + 1),
    );
    const { notes } = learningNotes(many);
    expect(notes.map(({ count }) => count)).toEqual([7, 6, 5, 4, 3]);
  });

  it('have kind words for every pair of states: no blame, nothing promised', () => {
    for (const read of CELL_STATES) {
      for (const settled of CELL_STATES) {
        if (read === settled || read === 'unread' || settled === 'unread') continue;
        const words = learningNotes(cells(read, settled, 1)).notes[0]?.words ?? '';
        expect(words).toMatch(/^You read the one .+ as .+\. .+\.$/);
        expect(words).not.toMatch(/wrong|mistake|error|fail|careless|should|harmless|safe|guarantee|saved/i);
      }
    }
  });
});
