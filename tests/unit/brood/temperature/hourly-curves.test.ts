import { describe, expect, it } from 'vitest';
import { linvill, partonLogan } from '@/lib/brood/temperature/hourly-curves';
import vectors from '@/tests/fixtures/temperature/temperature.json';

const { hourly } = vectors;
const DAY = {
  min: hourly.Tmin,
  max: hourly.Tmax,
  nextMin: hourly.next_Tmin,
  dayLength: hourly.sunset - hourly.sunrise,
};

describe('hours drawn through a day of 12 to 26 °C with the sun up from 5 to 21', () => {
  it.each(Object.entries(hourly.linvill))(
    'is at %s h %d °C by Linvill 1990 (form read in an R package)',
    (hour, celsius) => {
      expect(Math.abs(linvill(DAY, Number(hour) - hourly.sunrise) - celsius)).toBeLessThan(1e-6);
    },
  );

  it.each(Object.entries(hourly.parton_logan_air150cm))(
    'is at %s h %d °C by Parton & Logan 1981 (air at 1.5 m)',
    (hour, celsius) => {
      expect(Math.abs(partonLogan(DAY, Number(hour) - hourly.sunrise) - celsius)).toBeLessThan(1e-6);
    },
  );

  it('ends the night exactly at the next minimum by Linvill and above it by Parton & Logan', () => {
    expect(linvill(DAY, 24)).toBeCloseTo(13, 12);
    expect(partonLogan(DAY, 24)).toBeGreaterThan(13.5);
  });
});
