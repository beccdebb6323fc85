import { describe, expect, it } from 'vitest';
import { ROLES, isRole } from '@/lib/server/auth/role';
import { ACTIONS, type Action, may } from '@/lib/server/policies/may';

/** The table of rights, row by row: technician, reviewer, lead biologist, coordinator, researcher. */
const TABLE: Record<Action, string> = {
  'sync.enrol': 'yyy--',
  'sync.push': 'yyy--',
  'sync.have': 'yyy--',
  'sync.pull': 'yyyy-',
  'nests.read': 'yyyyy',
  'readings.read': 'yyyyy',
  'brood.read': 'yyyyy',
  'temperature.read': 'yyyyy',
  'temperature.write': 'yyyy-',
  'readings.settle': '-yy--',
  'readings.lock': '-yy--',
  'readings.amend': '-yy--',
  'review.read': '-yy--',
  'review.work': '-yy--',
  'agreement.read': 'yyy--',
  'agreement.everyone': '-yy--',
  'notes.everyone': '--y--',
  'samples.draw': '-yy--',
  'settings.read': 'yyyyy',
  'settings.write': '--y--',
  'people.read': '-yyy-',
  'members.write': '---y-',
  'letters.read': '---y-',
  'devices.read': 'yyyy-',
  'devices.revoke': 'yyyy-',
  'hosts.read': 'yyyy-',
  'export.read': '-yyyy',
};

describe('the table of rights', () => {
  it.each(ACTIONS)('of %s is as agreed', (action) => {
    expect(ROLES.map((role) => (may(role, action) ? 'y' : '-')).join('')).toBe(TABLE[action]);
  });

  it('knows five roles and no other', () => {
    expect(ROLES.every(isRole)).toBe(true);
    expect(['admin', 'Reviewer', ''].some(isRole)).toBe(false);
  });
});
