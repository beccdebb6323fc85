import { describe, expect, test } from 'vitest';
import type { Person } from '@/lib/offline/session-view';
import { readUnsentFile, writeUnsentFile } from '@/lib/offline/unsent-file';
import { ME, READING, VISIT, row, sha256 } from '@/tests/support/sim/local-ops';

const PERSON: Person = {
  teamId: 'team',
  teamName: 'Quillard Field Room',
  userId: ME,
  displayName: 'Tobiah Marsh',
  role: 'technician',
  zone: 'America/New_York',
  members: [],
};

const mark = (n: number) =>
  row({ kind: 'cell.mark', n, visit: VISIT, reading: READING, body: { q: n, r: 0, state: 'egg' } });

function write() {
  const { bodyHash: _hash, n: _n, hlc: _hlc, deviceId: _device, ...draft } = mark(9).op;
  return writeUnsentFile(sha256, {
    person: PERSON,
    exportedAt: '2026-06-16T09:41:00.000Z',
    rows: [mark(4), { ...mark(5), state: 'refused', code: 'right' }],
    notSaved: [{ ...draft, body: { ...draft.body, note: undefined as never } }],
  });
}

describe('the file of unsent work', () => {
  test('comes back as it went out, with whose it is, its version and its hash', async () => {
    const text = await write();
    const read = await readUnsentFile(sha256, text);
    if (!read.ok) throw new Error(read.fault);
    expect(read.file).toMatchObject({ version: 1, teamId: 'team', userId: ME, displayName: 'Tobiah Marsh' });
    expect(read.file.hash).toMatch(/^[0-9a-f]{64}$/);
    expect(read.file.ops.map(({ op }) => op)).toEqual([mark(4).op, mark(5).op]);
    expect(read.file.ops.map(({ code }) => code)).toEqual([null, 'right']);
    expect(read.file.notSaved.map(({ opId }) => opId)).toEqual([mark(9).op.opId]);
  });

  test('is read the same with its members in another order and other white space', async () => {
    const backwards = Object.entries(JSON.parse(await write())).reverse();
    expect(await readUnsentFile(sha256, JSON.stringify(Object.fromEntries(backwards)))).toMatchObject({ ok: true });
  });

  test.each([
    ['one letter of a mark', (text: string) => text.replace('"egg"', '"eggs"')],
    ['the name of its person', (text: string) => text.replace('Tobiah', 'Oriel')],
    ['an operation fewer', (text: string) => JSON.stringify({ ...JSON.parse(text), ops: [] })],
    ['a member that no version knows', (text: string) => JSON.stringify({ ...JSON.parse(text), also: 1 })],
    ['no hash', (text: string) => JSON.stringify({ ...JSON.parse(text), hash: undefined })],
  ])('is not taken when it was changed: %s', async (_what, change) => {
    expect(await readUnsentFile(sha256, change(await write()))).toEqual({ ok: false, fault: 'changed' });
  });

  test.each(['', 'hello', '[]', 'null', '{"file":"something-else"}', '{"file":"undereave-unsent"'])(
    'is told from what is no such file: %s',
    async (text) => {
      expect(await readUnsentFile(sha256, text)).toEqual({ ok: false, fault: 'other' });
    },
  );

  test('of a newer app is not guessed at', async () => {
    const newer = JSON.stringify({ ...JSON.parse(await write()), version: 2 });
    expect(await readUnsentFile(sha256, newer)).toEqual({ ok: false, fault: 'newer' });
  });
});
