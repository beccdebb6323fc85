import { describe, expect, it } from 'vitest';
import { hashPassword, isPasswordLength, isTooLong, verifyPassword } from '@/lib/server/auth/password';

describe('a password', () => {
  it('is hashed with Argon2id at 19 MiB, two passes, one lane (OWASP password storage)', async () => {
    expect(await hashPassword('seventeen grey kettles')).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
  });

  it('opens its own hash and no other, and every hash has its own salt', async () => {
    const [first, second] = await Promise.all([
      hashPassword('seventeen grey kettles'),
      hashPassword('seventeen grey kettles'),
    ]);
    expect(first).not.toBe(second);
    expect(await verifyPassword(first, 'seventeen grey kettles')).toBe(true);
    expect(await verifyPassword(first, 'seventeen grey kettles ')).toBe(false);
    expect(await verifyPassword(null, 'seventeen grey kettles')).toBe(false);
  });

  it('has 15 to 256 characters, counted as people count them', () => {
    expect([14, 15, 256, 257].map((length) => isPasswordLength('x'.repeat(length)))).toEqual([
      false,
      true,
      true,
      false,
    ]);
    expect(isPasswordLength('😀'.repeat(14))).toBe(false);
    expect(isPasswordLength('😀'.repeat(256))).toBe(true);
    expect(isTooLong('x'.repeat(1_000_000))).toBe(true);
  });
});
