import 'server-only';

/** What a member is in a team; `biologist` is the lead biologist. */
export const ROLES = ['technician', 'reviewer', 'biologist', 'coordinator', 'researcher'] as const;

/** One of `ROLES`. */
export type Role = (typeof ROLES)[number];

/** Is this one of the five role words? */
export function isRole(value: string): value is Role {
  return (ROLES as readonly string[]).includes(value);
}
