/** A share with its 95 % interval in one month. */
export interface SharePoint {
  /** `YYYY-MM`. */
  month: string;
  /** From 0 to 1. */
  share: number;
  interval: { low: number; high: number };
  /** Things it is made from. */
  n: number;
}
