/** Adults to expect on one day, with the range that holds 8 times in 10. */
export interface EmergenceDay {
  /** `YYYY-MM-DD`. */
  date: string;
  expected: number;
  lo80: number;
  hi80: number;
}
