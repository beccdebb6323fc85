import { v7 } from 'uuid';
import { describe, expect, it } from 'vitest';
import { bytesToUuid, isUuidText, uuidToBytes } from '@/lib/kit/uuid';
import vectors from '@/tests/fixtures/kit/ids-clocks.json';

describe('UUID text', () => {
  it('carries the fields of the published version 7 vector (RFC 9562 appendix A.6)', () => {
    const { uuid, unix_ts_hex, version, rand_a_hex, rand_b_hex } = vectors.uuidv7;
    const hex = Buffer.from(uuidToBytes(uuid)).toString('hex');
    expect(hex.slice(0, 12)).toBe(unix_ts_hex);
    expect(Number.parseInt(unix_ts_hex, 16)).toBe(vectors.uuidv7.unix_ts_ms);
    expect(hex[12]).toBe(String(version));
    expect(hex.slice(13, 16)).toBe(rand_a_hex);
    // The variant takes the top two bits of what follows.
    expect((BigInt(`0x${hex.slice(16)}`) & ((1n << 62n) - 1n)).toString(16)).toBe(rand_b_hex);
    expect(BigInt(`0x${hex.slice(16)}`) >> 62n).toBe(0b10n);
  });

  it.each([vectors.uuidv7.uuid, vectors.uuidv5.uuid, vectors.special.nil, vectors.special.max])(
    'takes %s and gives it back',
    (uuid) => {
      expect(isUuidText(uuid)).toBe(true);
      expect(bytesToUuid(uuidToBytes(uuid))).toBe(uuid);
    },
  );

  it.each([
    '017F22E2-79B0-7CC3-98C4-DC0C0C07398F',
    '{017f22e2-79b0-7cc3-98c4-dc0c0c07398f}',
    '017f22e279b07cc398c4dc0c0c07398f',
    '017f22e2-79b0-7cc3-98c4-dc0c0c07398',
    '017f22e2-79b0-7cc3-98c4-dc0c0c07398f\n',
    'a'.repeat(200),
    '',
    null,
    17,
  ])('refuses any other spelling: %j', (value) => {
    expect(isUuidText(value)).toBe(false);
  });

  it('gives the server ids whose order is the order in which they were made', () => {
    const made = Array.from({ length: 50 }, () => v7());
    expect([...made].sort()).toEqual(made);
  });
});
