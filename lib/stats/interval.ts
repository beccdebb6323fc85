/** Two limits of an estimate, lower first. */
export interface Interval {
  low: number;
  high: number;
}

/** The 97.5 % point of the standard normal law: every interval here is a 95 % one. */
export const Z_95 = 1.959963984540054;
