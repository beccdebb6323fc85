import 'server-only';
import type { Role } from '@/lib/server/auth/role';

const EVERYONE: readonly Role[] = ['technician', 'reviewer', 'biologist', 'coordinator', 'researcher'];
const RECORDERS: readonly Role[] = ['technician', 'reviewer', 'biologist'];
const SETTLERS: readonly Role[] = ['reviewer', 'biologist'];

/** The one table of rights: who may do what within their own team. */
const RIGHTS = {
  'sync.enrol': RECORDERS,
  'sync.push': RECORDERS,
  'sync.pull': ['technician', 'reviewer', 'biologist', 'coordinator'],
  'sync.have': RECORDERS,
  'nests.read': EVERYONE,
  'readings.read': EVERYONE,
  'brood.read': EVERYONE,
  'temperature.read': EVERYONE,
  'temperature.write': ['technician', 'reviewer', 'biologist', 'coordinator'],
  'readings.settle': SETTLERS,
  'readings.lock': SETTLERS,
  'readings.amend': SETTLERS,
  'review.read': SETTLERS,
  'review.work': SETTLERS,
  'agreement.read': RECORDERS,
  'agreement.everyone': SETTLERS,
  'notes.everyone': ['biologist'],
  'samples.draw': SETTLERS,
  'settings.read': EVERYONE,
  'settings.write': ['biologist'],
  'people.read': ['reviewer', 'biologist', 'coordinator'],
  'members.write': ['coordinator'],
  'letters.read': ['coordinator'],
  'devices.read': ['technician', 'reviewer', 'biologist', 'coordinator'],
  'devices.revoke': ['technician', 'reviewer', 'biologist', 'coordinator'],
  'hosts.read': ['technician', 'reviewer', 'biologist', 'coordinator'],
  'export.read': ['reviewer', 'biologist', 'coordinator', 'researcher'],
} as const satisfies Record<string, readonly Role[]>;

/** Something a person may or may not do. */
export type Action = keyof typeof RIGHTS;

/** Every action, for tests that go through the whole table. */
export const ACTIONS = Object.keys(RIGHTS) as Action[];

/** May this role do that? */
export function may(role: Role, action: Action): boolean {
  const allowed: readonly Role[] = RIGHTS[action];
  return allowed.includes(role);
}
