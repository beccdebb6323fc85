import { describe, expect, it } from 'vitest';
import { type FirstStepsView, firstStepsOf } from '@/components/lab/start/first-steps';

const EMPTY: FirstStepsView = { technicians: 0, invited: 0, phones: 0, nests: 0, readings: 0, dated: null };
const states = (view: Partial<FirstStepsView>) =>
  firstStepsOf({ ...EMPTY, ...view }, 'coordinator').map(({ state }) => state);

describe('the first steps of a team', () => {
  it('begin with inviting somebody, one step at a time', () => {
    expect(states({})).toEqual(['now', 'later', 'later', 'later', 'later']);
    expect(states({ technicians: 1 })).toEqual(['done', 'now', 'later', 'later', 'later']);
    expect(states({ technicians: 1, phones: 1 })).toEqual(['done', 'done', 'now', 'later', 'later']);
  });

  it('do not hold up what can be done while an invitation is not answered', () => {
    expect(states({ invited: 2 })).toEqual(['waiting', 'now', 'later', 'later', 'later']);
    expect(firstStepsOf({ ...EMPTY, invited: 2 }, 'coordinator')[0]?.has).toBe('2 invitations not answered yet');
  });

  it('end with the dates of a nest, and lead to her', () => {
    const dated = { id: 'x', code: 'W01' };
    const all = firstStepsOf({ technicians: 1, invited: 1, phones: 1, nests: 1, readings: 1, dated }, 'reviewer');
    expect(all.every(({ state }) => state === 'done')).toBe(true);
    expect(all.at(-1)?.way).toEqual({ href: '/nests/x', words: 'Open W01' });
  });

  it('offer each reader only what their role may do', () => {
    const ways = (role: 'coordinator' | 'technician' | 'researcher') =>
      firstStepsOf(EMPTY, role).map(({ way }) => way?.href ?? null);
    expect(ways('coordinator')).toEqual(['/members', null, null, null, null]);
    expect(ways('technician')).toEqual([null, '/field', '/field', '/field', null]);
    expect(ways('researcher')).toEqual([null, null, null, null, null]);
  });
});
