import { isAddress } from '@/lib/comb/axial';
import type { Mark } from '@/lib/comb/mark';
import { isCellState } from '@/lib/comb/states';
import type { Json } from '@/lib/protocol/canonical-json';
import type { Op } from '@/lib/protocol/op';

function textOrNull(value: Json | undefined): string | null {
  return typeof value === 'string' ? value : null;
}

/** The mark that a `cell.mark` operation makes; null for one that this version cannot draw. */
export function markOfOp({ opId, hlc, at, body }: Pick<Op, 'opId' | 'hlc' | 'at' | 'body'>): Mark | null {
  const { q, r, state } = body;
  if (!isAddress(q, r) || !isCellState(state)) return null;
  return {
    opId,
    hlc,
    at: at.wall,
    q: Number(q),
    r: Number(r),
    state,
    nectar: body.nectar === true,
    unsure: body.unsure === true,
    reused: body.reused === true,
    scrap: body.scrap === true,
    instar: typeof body.instar === 'number' ? body.instar : null,
    note: textOrNull(body.note),
    supersedes: textOrNull(body.supersedes),
  };
}

/** The mark that a `cell.retract` operation takes back. */
export function targetOfOp({ body }: Pick<Op, 'body'>): string | null {
  return textOrNull(body.target);
}
