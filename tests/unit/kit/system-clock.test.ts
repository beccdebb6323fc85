import { describe, expect, it } from 'vitest';
import { isUuidText } from '@/lib/kit/uuid';
import { systemClock } from '@/lib/kit/system-clock';

describe('the clock of this machine', () => {
  it('never goes back on its monotonic side and names its boot', () => {
    const first = systemClock.mono();
    expect(systemClock.mono()).toBeGreaterThanOrEqual(first);
    expect(isUuidText(systemClock.boot())).toBe(true);
    expect(systemClock.boot()).toBe(systemClock.boot());
    expect(Math.abs(systemClock.now() - Date.now())).toBeLessThan(1_000);
  });
});
