import { describe, expect, test } from 'vitest';
import type { DrainEnd } from '@/lib/offline/drain-ports';
import { type SyncFacts, statusCount, statusWords, syncStatus } from '@/lib/offline/sync-status';

const ZONE = 'America/New_York';

/** 14:02 in New York. */
const TWO_PAST_TWO = Date.UTC(2026, 5, 16, 18, 2);

const NONE = { queued: 0, suspect: 0, refused: 0, setAside: 0 };

function facts({
  counts = {},
  ...part
}: Partial<Omit<SyncFacts, 'counts'>> & { counts?: Partial<SyncFacts['counts']> } = {}): SyncFacts {
  return { notSaved: 0, lastSync: null, progress: null, lastEnd: null, ...part, counts: { ...NONE, ...counts } };
}

const words = (part: Parameters<typeof facts>[0]) => statusWords(syncStatus(facts(part)), ZONE);

const again = (trouble: 'no-answer' | 'no-real-connection'): DrainEnd => ({ kind: 'again', trouble, afterMs: null });

describe('the words in the corner', () => {
  test('are those of the trade, from the phone to the office', () => {
    expect(words({})).toBe('saved here');
    expect(words({ counts: { queued: 7 } })).toBe('waiting to send (7)');
    expect(words({ counts: { queued: 7 }, progress: { k: 3, n: 7 } })).toBe('sending 3 of 7');
    expect(words({ lastSync: TWO_PAST_TWO })).toBe('at the office 14:02');
    expect(words({ notSaved: 1 })).toBe('needs you');
  });

  test('never say "at the office" while something waits', () => {
    expect(words({ lastSync: TWO_PAST_TWO, counts: { queued: 1 } })).toBe('waiting to send (1)');
  });

  test('say "needs you" before anything else, and what waits is not forgotten', () => {
    const part = { counts: { queued: 4, refused: 2 }, progress: { k: 1, n: 4 }, lastSync: TWO_PAST_TWO };
    expect(words(part)).toBe('needs you');
    expect(syncStatus(facts(part))).toMatchObject({ waiting: 4, needs: [{ what: 'refused', count: 2 }] });
  });
});

describe('a person is needed', () => {
  test.each<[DrainEnd['kind']]>([['sign-in'], ['revoked'], ['role'], ['update'], ['cleared']])(
    'when a pass ends with %s',
    (kind) => {
      const lastEnd = { kind } as DrainEnd;
      expect(syncStatus(facts({ lastEnd, counts: { queued: 3 } }))).toEqual({
        kind: 'needs-you',
        waiting: 3,
        needs: [{ what: kind }],
      });
    },
  );

  test('for every list that is not empty', () => {
    const status = syncStatus(facts({ notSaved: 1, counts: { suspect: 2, refused: 3, setAside: 4 } }));
    expect(status).toMatchObject({
      needs: [
        { what: 'not-saved', count: 1 },
        { what: 'refused', count: 3 },
        { what: 'suspect', count: 2 },
        { what: 'set-aside', count: 4 },
      ],
    });
    expect(statusCount(status)).toBe(10);
  });

  test('not because the last attempt found no answer', () => {
    expect(syncStatus(facts({ lastEnd: again('no-answer'), counts: { queued: 1 } }))).toEqual({
      kind: 'waiting',
      waiting: 1,
      trouble: 'no-answer',
    });
  });
});

test('a connection that is none is told apart from no answer', () => {
  const status = syncStatus(facts({ lastEnd: again('no-real-connection'), lastSync: TWO_PAST_TWO }));
  expect(status).toEqual({ kind: 'at-office', at: TWO_PAST_TWO, trouble: 'no-real-connection' });
});

test('the badge shows what is not at the office yet', () => {
  expect(statusCount(syncStatus(facts()))).toBe(0);
  expect(statusCount(syncStatus(facts({ lastSync: 1 })))).toBe(0);
  expect(statusCount(syncStatus(facts({ counts: { queued: 7 } })))).toBe(7);
  expect(statusCount({ kind: 'sending', k: 3, n: 7 })).toBe(5);
});
