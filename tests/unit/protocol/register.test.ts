import { describe, expect, it } from 'vitest';
import { entityOf } from '@/lib/protocol/entity-of';
import { basesOf, registerWinner } from '@/lib/protocol/register';
import { registerOf, registerSetOf } from '@/lib/protocol/register-of';

function setting(opId: string, hlc: string, bases: string[] = []) {
  return { opId, hlc, bases, value: opId };
}

describe('a register', () => {
  it('shows the setting nothing else was made from', () => {
    expect(registerWinner([setting('a', '9.0'), setting('b', '1.0', ['a'])])?.opId).toBe('b');
  });

  it('shows the later clock, then the higher id, when two are left', () => {
    expect(registerWinner([setting('a', '9.0'), setting('b', '10.0')])?.opId).toBe('b');
    expect(registerWinner([setting('b', '9.0'), setting('a', '9.0')])?.opId).toBe('b');
  });

  it('is settled by one that names both', () => {
    const sets = [setting('a', '5.0'), setting('b', '9.0'), setting('c', '1.0', ['a', 'b'])];
    expect(registerWinner(sets)?.opId).toBe('c');
  });

  it('shows nothing when nothing was set', () => {
    expect(registerWinner([])).toBeNull();
  });

  it('is named by kind, entity and field', () => {
    const nest = '017f22e2-79b0-7cc3-98c4-dc0c0c07398f';
    const op = {
      kind: 'field.set',
      nest,
      visit: null,
      reading: null,
      body: { entity: 'nest', field: 'name', value: 'x', base: null },
    };
    const byId = { ...op, body: { ...op.body, entity: nest } };
    expect(registerOf(byId)).toBe(registerOf(op));
    expect(registerOf({ ...op, body: { ...op.body, field: 'code' } })).not.toBe(registerOf(op));
    expect(registerOf({ ...op, kind: 'note.set' })).not.toBe(registerOf(op));
    expect(registerOf({ ...op, kind: 'cell.mark' })).toBeNull();
    expect(registerOf({ ...op, body: { ...op.body, entity: 'visit' } })).toBeNull();
    expect(entityOf(op)).toEqual({ type: 'nest', id: nest });
  });

  it('takes its bases from null, one id or a list', () => {
    expect([basesOf(null), basesOf('a'), basesOf(['a', 'b']), basesOf(undefined)]).toEqual([[], ['a'], ['a', 'b'], []]);
    const entry = registerSetOf({
      opId: 'o',
      hlc: '1.0',
      kind: 'note.set',
      body: { entity: 'nest', text: 'wet', base: 'a' },
    });
    expect(entry).toEqual({ opId: 'o', hlc: '1.0', bases: ['a'], value: 'wet' });
  });
});
