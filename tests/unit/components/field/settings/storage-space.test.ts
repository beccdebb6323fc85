import { afterEach, describe, expect, test, vi } from 'vitest';
import { isLow, keepStorage, readStorage, spaceWords } from '@/components/field/settings/storage-space';

afterEach(() => vi.unstubAllGlobals());

describe('the phone’s storage', () => {
  test('is reported as the browser says', async () => {
    const storage = { persisted: async () => true, estimate: async () => ({ quota: 900, usage: 200 }) };
    vi.stubGlobal('navigator', { storage });
    expect(await readStorage()).toEqual({ kept: true, left: 700 });
  });

  test('is unknown where the browser says nothing or fails', async () => {
    vi.stubGlobal('navigator', {});
    expect(await readStorage()).toEqual({ kept: null, left: null });
    expect(await keepStorage()).toBe(false);
    vi.stubGlobal('navigator', { storage: { persist: () => Promise.reject(new Error('no')) } });
    expect(await keepStorage()).toBe(false);
  });

  test('is low below 50 MB, and never where the browser does not say', () => {
    expect([49_999_999, 50_000_000, null].map(isLow)).toEqual([true, false, false]);
  });

  test('is said in megabytes, with a warning when there is little', () => {
    expect(spaceWords(2_400_000_000)).toBe('About 2,400 MB left for records.');
    expect(spaceWords(12_000_000)).toMatch(/Only about 12 MB left/);
    expect(spaceWords(null)).toMatch(/does not say/);
  });
});
