/** A stretch of time that was not measured: drawn between its neighbours, or counted as calendar days. */
export interface FilledRange {
  /** Epoch milliseconds. */
  from: number;
  to: number;
  how: 'interpolated' | 'calendar';
}

/** What a temperature record gives cause to say. */
export interface HeatWarning {
  code: 'heat' | 'long-gap' | 'no-place' | 'no-sun' | 'sparse';
  text: string;
}

/** A record as a function of time, with what was not measured in it. */
export interface TemperatureCurve {
  /** The first and last instant it says anything about, epoch milliseconds. */
  from: number;
  to: number;
  /** °C at an instant, or null where days are calendar days. */
  at(epochMs: number): number | null;
  filled: FilledRange[];
  warnings: HeatWarning[];
}

/** One decimal, as a person would read it off. */
export function degreesText(celsius: number): string {
  return `${celsius.toFixed(1)} °C`;
}
