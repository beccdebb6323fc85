import { describe, expect, it } from 'vitest';
import { auditLines, auditOptions } from '@/lib/cli/audit-report';

const HEAD = 'ab'.repeat(32);
const SOUND = { team: 'Tarrow', entries: 13, finals: 4, settlements: 16, head: HEAD, known: [HEAD], faults: [] };

describe('the report of npm run audit', () => {
  it('says of a sound chain how long it is and where it ends, to be noted elsewhere', () => {
    const { lines, holds } = auditLines([SOUND], [HEAD]);
    expect(holds).toBe(true);
    expect(lines).toEqual(['Tarrow: unbroken (13 entries, 4 final readings, 16 decisions)', `  head ${HEAD}`]);
  });

  it('names the first broken link first and counts what it does not list', () => {
    const faults = [4, 5, 6, 7, 8, 9].map((seq) => ({ seq, found: 'was changed after it was written' }));
    const { lines, holds } = auditLines([{ ...SOUND, faults }], []);
    expect(holds).toBe(false);
    expect(lines[0]).toContain('Tarrow: BROKEN');
    expect(lines[1]).toBe('  entry 4: was changed after it was written');
    expect(lines.at(-1)).toBe('  and 1 more');
  });

  it('fails when a head that was noted is in no chain', () => {
    expect(auditLines([{ ...SOUND, known: [] }], [HEAD]).holds).toBe(false);
  });

  it('takes heads and nothing else', () => {
    expect(auditOptions([])).toEqual({ heads: [] });
    expect(auditOptions(['--head', HEAD.toUpperCase()])).toEqual({ heads: [HEAD] });
    expect(auditOptions(['--head'])).toBeNull();
    expect(auditOptions(['--head', 'xyz'])).toBeNull();
    expect(auditOptions(['--fix'])).toBeNull();
  });
});
