/** One measurement of a logger. */
export interface LoggerReading {
  /** Epoch milliseconds. */
  at: number;
  /** °C. */
  celsius: number;
}

/** The lowest and highest temperature of one local day of the nest, in °C. */
export interface DailyExtremes {
  /** Local date, `YYYY-MM-DD`. */
  date: string;
  min: number;
  max: number;
}

/** What is known of a nest's temperature: a logger's readings in the order of time, or daily extremes by date. */
export type TemperatureRecord =
  { kind: 'logger'; readings: readonly LoggerReading[] } | { kind: 'daily'; days: readonly DailyExtremes[] };

/** No nest on earth was this cold or this warm: a value outside is a fault of the logger or of the file, in °C. */
export const POSSIBLE_C = { min: -40, max: 70 } as const;

/** Could a thermometer at a nest have shown this, in °C? */
export function isPossible(celsius: number): boolean {
  return celsius >= POSSIBLE_C.min && celsius <= POSSIBLE_C.max;
}
