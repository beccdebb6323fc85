import 'server-only';
import { z } from 'zod';
import { cellKey, isAddress } from '@/lib/comb/axial';
import { CELL_STATES } from '@/lib/comb/states';
import { SETTLE_PICKS } from '@/lib/comb/settle-pick';
import { DECISION_REASON } from './decision-reason';

/** −0 becomes 0: one address has one spelling. */
const coordinate = z.number().transform((value) => value + 0);

const settledCell = z
  .strictObject({
    q: coordinate,
    r: coordinate,
    state: z.enum(CELL_STATES),
    reason: DECISION_REASON,
    /** Whose view is taken, where two readings are compared. */
    pick: z.enum(SETTLE_PICKS).nullish(),
  })
  .refine(({ q, r }) => isAddress(q, r));

/**
 * Body of `POST /api/readings/<id>/settle`: at least one cell, none twice. `seen` is the number of the last decision
 * the person had before them; left out, it is the last one when the request came.
 */
export const SETTLE_INPUT = z
  .strictObject({ cells: z.array(settledCell).min(1), seen: z.number().int().min(0).nullish() })
  .refine(({ cells }) => new Set(cells.map(cellKey)).size === cells.length);

/** The parsed body. */
export type SettleInput = z.output<typeof SETTLE_INPUT>;
