import type { AmendmentView, ReviewView, SettlementView } from './lab-shapes';

/** One thing that happened to a final reading. */
export type Decision =
  | { kind: 'settled'; at: string; settlement: SettlementView }
  | { kind: 'amended'; at: string; amendment: AmendmentView };

/** Settled cells and opened versions of a reading as one history, newest first. */
export function decisionHistory({
  settlements,
  amendments,
}: Pick<ReviewView, 'settlements' | 'amendments'>): Decision[] {
  const decisions: Decision[] = [
    ...settlements.map((settlement) => ({ kind: 'settled' as const, at: settlement.at, settlement })),
    ...amendments.map((amendment) => ({ kind: 'amended' as const, at: amendment.at, amendment })),
  ];
  return decisions.sort((a, b) => Date.parse(b.at) - Date.parse(a.at));
}
