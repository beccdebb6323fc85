import { describe, expect, it } from 'vitest';
import { isUuidText } from '@/lib/kit/uuid';
import { demoId, demoSeed } from '@/lib/server/demo/build/demo-id';

describe('a demo id', () => {
  it('is a UUIDv7 of the opening of the season (RFC 9562, section 5.7)', () => {
    const id = demoId('nest/N12');
    expect(isUuidText(id)).toBe(true);
    expect(Number.parseInt(id.replaceAll('-', '').slice(0, 12), 16)).toBe(Date.parse('2026-04-01T12:00:00Z'));
    expect(id[14]).toBe('7');
    expect('89ab').toContain(id[19]);
  });

  it('depends on the name alone', () => {
    expect(demoId('nest/N12')).toBe(demoId('nest/N12'));
    expect(demoId('nest/N12')).not.toBe(demoId('nest/N11'));
    expect(demoSeed('nest/N12')).not.toBe(demoSeed('nest/N11'));
  });
});
