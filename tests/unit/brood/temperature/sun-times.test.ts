import { describe, expect, it } from 'vitest';
import { sunPosition, sunTimes } from '@/lib/brood/temperature/sun-times';
import vectors from '@/tests/fixtures/temperature/sun-meeus-spa.json';

const GOLDEN = { lat: 39.742476, lon: -105.1786 };
const secondsOf = (text: string): number =>
  text.split(':').reduce((sum, part) => sum * 60 + Number(part.replace('Z', '')), 0);
const secondsOfDay = (epochMs: number | null): number => ((epochMs ?? NaN) / 1000) % 86_400;

describe('the sun', () => {
  it('stands where Meeus, example 25.a, puts it on 1992-10-13 at 0 h dynamical time', () => {
    // The instant is taken as dynamical time: the function knows no difference between the two.
    const sun = sunPosition(Date.UTC(1992, 9, 13));
    expect(Math.abs(sun.trueLongitude - vectors.sun_1992_10_13_0h_TD.true_longitude_deg)).toBeLessThan(1e-4);
    expect(Math.abs(sun.radius - vectors.sun_1992_10_13_0h_TD.radius_AU)).toBeLessThan(1e-5);
    // -7°47′06″, apparent.
    expect(Math.abs(sun.declination + (7 + 47 / 60 + 6 / 3600))).toBeLessThan(1 / 3600);
  });

  it('runs ahead of the clock by 13 min 42.7 s on that day (Meeus, example 28.b, Smart’s form 0.0598256 rad)', () => {
    const sun = sunPosition(Date.UTC(1992, 9, 13));
    const smartMinutes = (vectors.sun_1992_10_13_0h_TD.equation_of_time_smart_rad * 720) / Math.PI;
    expect(Math.abs(sun.equationOfTime - smartMinutes)).toBeLessThan(0.005);
  });

  it.each(vectors.rise_set.slice(0, 2))(
    'rises, culminates and sets at 35° S on $date within 5 s of NREL’s solar position algorithm',
    ({ lat, lon, date, sunrise = '', transit, sunset = '' }) => {
      const sun = sunTimes(date, { lat, lon });
      expect(Math.abs(secondsOfDay(sun.sunrise) - secondsOf(sunrise))).toBeLessThan(5);
      expect(Math.abs(secondsOfDay(sun.transit) - secondsOf(transit ?? ''))).toBeLessThan(5);
      expect(Math.abs(secondsOfDay(sun.sunset) - secondsOf(sunset))).toBeLessThan(5);
    },
  );

  it('gives the times of the place’s own date, far west of Greenwich too (NREL, Golden, 2015-01-02)', () => {
    const sun = sunTimes('2015-01-02', GOLDEN);
    expect(Math.abs((sun.sunrise ?? 0) - Date.parse('2015-01-02T14:21:55Z'))).toBeLessThan(5000);
    expect(Math.abs((sun.sunset ?? 0) - Date.parse('2015-01-02T23:47:43Z'))).toBeLessThan(5000);
  });

  it('sets at Golden on 2015-08-02 in the minute the US Naval Observatory prints, 19:13 MST', () => {
    const sunset = sunTimes('2015-08-02', GOLDEN).sunset ?? 0;
    expect(Math.abs(sunset - Date.parse('2015-08-03T02:13:00Z'))).toBeLessThan(30_000);
  });

  it('neither rises nor sets inside the polar circle at midsummer', () => {
    expect(sunTimes('2026-06-21', { lat: 78.2, lon: 15.6 })).toMatchObject({ sunrise: null, sunset: null });
  });
});
