const DAY_MS = 86_400_000;
/** Julian Day of 1970-01-01 00:00 UTC. */
const JD_1970 = 2_440_587.5;
const JD_2000 = 2_451_545;
/** Altitude of the sun's centre when its upper limb touches the horizon: refraction 34′ and half the disc, 16′. */
const RISE_ALTITUDE = -0.833;

const sin = (degrees: number): number => Math.sin((degrees * Math.PI) / 180);
const cos = (degrees: number): number => Math.cos((degrees * Math.PI) / 180);
const toDegrees = (radians: number): number => (radians * 180) / Math.PI;

/** A place on earth, in degrees; east and north are positive. */
export interface Place {
  lat: number;
  lon: number;
}

/** Where the sun stands as seen from the middle of the earth. */
export interface SunPosition {
  /** Apparent declination, degrees. */
  declination: number;
  /** Apparent minus mean solar time, minutes. */
  equationOfTime: number;
  /** Geometric longitude, degrees from 0 to 360. */
  trueLongitude: number;
  /** Distance in astronomical units. */
  radius: number;
}

/** The sun of one day: UTC instants in epoch milliseconds; null where she does not rise or set that day. */
export interface SunTimes {
  sunrise: number | null;
  transit: number;
  sunset: number | null;
}

/** Angles that a century count gives, degrees: mean longitude, mean anomaly, obliquity; and the eccentricity. */
function elements(t: number) {
  return {
    meanLongitude: 280.46646 + t * (36_000.76983 + t * 0.0003032),
    anomaly: 357.52911 + t * (35_999.05029 - t * 0.0001537),
    eccentricity: 0.016708634 - t * (0.000042037 + t * 0.0000001267),
    node: 125.04 - 1934.136 * t,
    obliquity: 23.4392911 - t * (0.0130041667 + t * (1.639e-7 - t * 5.036e-7)),
  };
}

/** Equation of time in minutes, W. M. Smart's form. */
function smartEquation(parts: ReturnType<typeof elements>, obliquity: number): number {
  const { meanLongitude: l, anomaly: m, eccentricity: e } = parts;
  const y = (sin(obliquity / 2) / cos(obliquity / 2)) ** 2;
  const radians =
    y * sin(2 * l) -
    2 * e * sin(m) +
    4 * e * y * sin(m) * cos(2 * l) -
    0.5 * y * y * sin(4 * l) -
    1.25 * e * e * sin(2 * m);
  return 4 * toDegrees(radians);
}

/**
 * The sun at an instant, good to about 0.01°.
 *
 * @param epochMs the instant; the minute by which earth time and dynamical time differ moves nothing that shows.
 * @see Meeus, Astronomical Algorithms, 2nd edition, chapters 25 (low accuracy) and 28.
 */
export function sunPosition(epochMs: number): SunPosition {
  const t = (epochMs / DAY_MS + JD_1970 - JD_2000) / 36_525;
  const parts = elements(t);
  const { anomaly: m, node, meanLongitude, eccentricity } = parts;
  const centre =
    (1.914602 - t * (0.004817 + t * 0.000014)) * sin(m) +
    (0.019993 - 0.000101 * t) * sin(2 * m) +
    0.000289 * sin(3 * m);
  const trueLongitude = meanLongitude + centre;
  const obliquity = parts.obliquity + 0.00256 * cos(node);
  const apparent = trueLongitude - 0.00569 - 0.00478 * sin(node);
  return {
    declination: toDegrees(Math.asin(sin(obliquity) * sin(apparent))),
    equationOfTime: smartEquation(parts, obliquity),
    trueLongitude: ((trueLongitude % 360) + 360) % 360,
    radius: (1.000001018 * (1 - eccentricity ** 2)) / (1 + eccentricity * cos(m + centre)),
  };
}

/** Milliseconds from transit to the horizon for a declination; null when the sun stays above or below it. */
function halfDay(lat: number, declination: number): number | null {
  const cosine = (sin(RISE_ALTITUDE) - sin(lat) * sin(declination)) / (cos(lat) * cos(declination));
  return Math.abs(cosine) > 1 ? null : (toDegrees(Math.acos(cosine)) / 360) * DAY_MS;
}

/** The instant the sun crosses the horizon on one side of a transit, refined where she then stands. */
function crossing(noon: number, { lat }: Place, side: -1 | 1): number | null {
  let at = noon;
  for (let round = 0; round < 3; round += 1) {
    const half = halfDay(lat, sunPosition(at).declination);
    if (half === null) return null;
    const drift = (sunPosition(noon).equationOfTime - sunPosition(at).equationOfTime) * 60_000;
    at = noon + drift + side * half;
  }
  return at;
}

/**
 * Sunrise, highest stand and sunset of the solar day that holds the local noon of a date.
 *
 * @param date local date of the place, `YYYY-MM-DD`.
 * @returns instants within some seconds of NREL's solar position algorithm; rise and set are null in polar day and
 *   night.
 */
export function sunTimes(date: string, place: Place): SunTimes {
  const mean = Date.parse(`${date}T12:00:00Z`) - (place.lon / 360) * DAY_MS;
  const first = mean - sunPosition(mean).equationOfTime * 60_000;
  const transit = mean - sunPosition(first).equationOfTime * 60_000;
  return { sunrise: crossing(transit, place, -1), transit, sunset: crossing(transit, place, 1) };
}
