/** An estimated date with its three central ranges, all `YYYY-MM-DD`. */
export interface ChartSpread {
  median: string;
  p50: readonly [string, string];
  p80: readonly [string, string];
  p95: readonly [string, string];
}
