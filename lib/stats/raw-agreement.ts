import type { ConfusionTable } from './confusion-table';
import { tableMargins } from './table-margins';

/** On how many of the pairs the two readers said the same. */
export interface RawAgreement {
  agreed: number;
  n: number;
  /** `agreed / n`; null when there was nothing to compare. */
  share: number | null;
}

/** The share of pairs on the diagonal of the table: agreement without any correction for chance. */
export function rawAgreement(table: ConfusionTable): RawAgreement {
  const { n } = tableMargins(table);
  const agreed = table.reduce((total, row, at) => total + (row[at] ?? 0), 0);
  return { agreed, n, share: n === 0 ? null : agreed / n };
}
