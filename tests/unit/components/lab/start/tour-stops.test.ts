import { readdirSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { TOUR, TOUR_NESTS, stopHref } from '@/components/lab/start/tour-stops';
import { may } from '@/lib/server/policies/may';
import { ROLES } from '@/lib/server/auth/role';
import { SEASON } from '@/lib/server/demo/season';

const IDS = Object.fromEntries(TOUR_NESTS.map((code) => [code, `id-of-${code}`]));

describe('the walk through the season', () => {
  it('goes only to nests the demo season has', () => {
    const codes = SEASON.flatMap((team) => team.nests.map(({ code }) => code));
    for (const code of TOUR_NESTS) expect(codes).toContain(code);
  });

  it('goes only to pages there are', () => {
    const pages = [...readdirSync('app/(lab)'), ...readdirSync('app/(field)')];
    for (const { at } of TOUR) if ('path' in at) expect(pages).toContain(at.path.slice(1));
  });

  it('leads nobody where their role may not go', () => {
    const needs = { '/hosts': 'hosts.read', '/downloads': 'export.read', '/members': 'members.write' } as const;
    for (const role of ROLES) {
      for (const stop of TOUR) {
        const href = stopHref(stop, role, IDS);
        const need = href !== null && href in needs ? needs[href as keyof typeof needs] : null;
        if (need) expect([role, href, may(role, need)]).toEqual([role, href, true]);
      }
    }
  });

  it('has no link to a nest that is not in the team', () => {
    for (const stop of TOUR) if ('nest' in stop.at) expect(stopHref(stop, 'reviewer', {})).toBeNull();
  });
});
