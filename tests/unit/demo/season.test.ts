import { describe, expect, it } from 'vitest';
import { isCellState } from '@/lib/comb/states';
import { OSSLE } from '@/lib/server/demo/ossle/ossle';
import { SEASON } from '@/lib/server/demo/season';
import { DEMO_PASSWORD } from '@/lib/server/demo/story/person';
import { TARROW } from '@/lib/server/demo/tarrow/tarrow';
import { PASSWORD_LENGTH, isPasswordLength } from '@/lib/server/auth/password';

/** Words about stings and success that the product never uses. */
const UNWELCOME = /\b(harmless|safe|guaranteed|saved|will not sting|success)\b/i;

describe('the demo season', () => {
  it('has the people who can sign in, each in the right role', () => {
    expect(Object.fromEntries(TARROW.people.map(({ email, role }) => [email.split('@')[0], role]))).toEqual({
      technician: 'technician',
      technician2: 'technician',
      technician3: 'technician',
      reviewer: 'reviewer',
      reviewer2: 'reviewer',
      biologist: 'biologist',
      coordinator: 'coordinator',
      researcher: 'researcher',
    });
    expect(OSSLE.people.map(({ email }) => email)).toEqual([
      'technician@ossle.example',
      'reviewer@ossle.example',
      'coordinator@ossle.example',
    ]);
  });

  it('has a password that the product itself would take', () => {
    expect(isPasswordLength(DEMO_PASSWORD), `${PASSWORD_LENGTH.min} or more`).toBe(true);
  });

  it('has twelve nests in order, each with an outcome', () => {
    expect(TARROW.nests.map(({ code }) => code)).toEqual(
      Array.from({ length: 12 }, (_, i) => `N${String(i + 1).padStart(2, '0')}`),
    );
    expect(TARROW.nests.map(({ code, outcome }) => [code, outcome?.outcome, outcome?.decidedOn])).toEqual([
      ['N01', 'raised', '2026-06-23'],
      ['N02', 'raised', '2026-06-22'],
      ['N03', 'raised', '2026-06-20'],
      ['N04', 'guard it in place', '2026-10-02'],
      ['N05', 'hand on: licensed pest management', '2026-06-04'],
      ['N06', 'raised', '2026-06-24'],
      ['N07', 'guard it in place', '2026-10-14'],
      ['N08', 'hand on: licensed pest management', '2026-05-20'],
      ['N09', 'left, rebuilt near', '2026-06-16'],
      ['N10', 'failed at visit', '2026-06-18'],
      ['N11', 'taken by birds', '2026-06-19'],
      ['N12', 'raised, other queen', '2026-06-27'],
    ]);
  });

  it('notes the true first emergence of the five nests that raised workers', () => {
    const noted = TARROW.nests.flatMap(({ code, outcome }) => {
      const date = /^First emergence (\S+)\./.exec(outcome?.note ?? '')?.[1];
      return date ? [[code, date]] : [];
    });
    expect(noted).toEqual([
      ['N01', '2026-06-23'],
      ['N02', '2026-06-22'],
      ['N03', '2026-06-20'],
      ['N06', '2026-06-24'],
      ['N12', '2026-06-27'],
    ]);
  });

  it('knows every taxon of its nests, and a different status of dominula in each team', () => {
    for (const { nests, taxa } of SEASON) {
      const known = taxa.map(({ scientificName }) => scientificName);
      expect(nests.filter(({ taxon }) => !known.includes(taxon))).toEqual([]);
    }
    const statuses = SEASON.map(
      ({ taxa }) => taxa.find(({ scientificName }) => scientificName === 'Polistes dominula')?.status,
    );
    expect(statuses).toEqual(['introduced', 'native']);
  });

  it('hangs no more nests at a host than there is room for', () => {
    const hosts = TARROW.nests.flatMap(({ acts }) =>
      acts.filter(({ body }) => body.field === 'host').map(({ body }) => body.value),
    );
    for (const { code, capacity } of TARROW.hosts)
      expect(hosts.filter((host) => host === code).length).toBeLessThanOrEqual(capacity);
    expect(hosts.length).toBe(6);
  });

  it('uses only the words the product uses', () => {
    expect(JSON.stringify(SEASON)).not.toMatch(UNWELCOME);
  });

  it('reads every cell in one of the twelve states', () => {
    const cells = SEASON.flatMap(({ nests }) =>
      nests.flatMap(({ visits }) => visits.flatMap(({ readings }) => readings.flatMap((r) => r.cells))),
    );
    expect(cells.filter(({ state }) => !isCellState(state))).toEqual([]);
  });
});
