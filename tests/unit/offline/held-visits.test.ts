import { describe, expect, it } from 'vitest';
import { noteHeld } from '@/lib/offline/held-visits';
import { type StoreMeta, newMeta } from '@/lib/offline/store';

const META: StoreMeta = { ...newMeta('s', 'u'), epoch: 1, cursor: 90 };
const A = { visit: 'a', cursor: '1:10' };
const B = { visit: 'b', cursor: '1:40' };

function after(meta: StoreMeta, held: (typeof A)[], epoch = 1) {
  return noteHeld({ held, epoch })({ meta, ops: new Map() });
}

describe('what the office holds back', () => {
  it('is remembered and moves nothing while it is held', () => {
    const first = after(META, [A, B]);
    expect(first).toEqual({ result: false, meta: { ...META, held: [A, B] } });
    expect(after({ ...META, held: [A, B] }, [A, B]).meta?.cursor).toBe(90);
  });

  it('is read again from its place once the visit is held no longer', () => {
    expect(after({ ...META, held: [A, B] }, [A])).toEqual({ result: true, meta: { ...META, cursor: 40, held: [A] } });
    expect(after({ ...META, held: [A, B] }, [])).toEqual({ result: true, meta: { ...META, cursor: 10, held: [] } });
  });

  it('is read again from the earliest place it ever was held from', () => {
    const later = { visit: 'a', cursor: '1:60' };
    expect(after({ ...META, held: [A] }, [later]).meta?.held).toEqual([A]);
    expect(after({ ...META, held: [later] }, [A]).meta?.held).toEqual([A]);
  });

  it('never moves the cursor forward, nor by a place of another epoch', () => {
    expect(after({ ...META, cursor: 5, held: [A] }, []).meta?.cursor).toBe(5);
    const old = { visit: 'a', cursor: '7:3' };
    expect(after({ ...META, held: [old] }, [])).toEqual({ result: false, meta: { ...META, held: [] } });
    expect(after({ ...META, held: [A] }, [], 2)).toEqual({ result: false });
  });

  it('costs no write where nothing was ever held', () => {
    expect(after(META, [])).toEqual({ result: false });
  });
});
