import { describe, expect, it } from 'vitest';
import { seenPlace } from '@/lib/server/policies/seen-place';

const PLACE = { lat: 43.598123, lon: -77.605432, accuracyM: 4 };

describe('the place a role sees', () => {
  it('is exact for everyone but a researcher', () => {
    for (const role of ['technician', 'reviewer', 'biologist', 'coordinator'] as const)
      expect(seenPlace(role, PLACE)).toEqual(PLACE);
  });

  it('is the south-west corner of its grid cell for a researcher, without an accuracy', () => {
    expect(seenPlace('researcher', PLACE)).toEqual({ lat: 43.59, lon: -77.61, accuracyM: null });
  });

  it('does not move when it is rounded again, also for values such as 0.29', () => {
    for (let hundredths = -18_000; hundredths <= 18_000; hundredths += 7) {
      const lat = hundredths / 100;
      expect(seenPlace('researcher', { lat, lon: 0, accuracyM: 1 })?.lat).toBe(lat);
    }
    expect(seenPlace('researcher', { lat: 0.29, lon: 1.15, accuracyM: 1 })).toEqual({
      lat: 0.29,
      lon: 1.15,
      accuracyM: null,
    });
  });

  it('is nowhere when there is none', () => {
    expect(seenPlace('researcher', null)).toBeNull();
  });
});
