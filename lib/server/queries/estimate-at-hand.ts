import 'server-only';
import type { BroodEstimate } from '@/lib/brood/answer';
import { estimateDigest, estimateNest } from '@/lib/brood/estimate-nest';
import type { BroodInput } from '@/lib/brood/input';
import { idKey } from './id-key';
import type { TeamScope } from './team-scope';

/** Estimates kept in this process; the one that was asked for longest ago makes room. */
const MOST_KEPT = 300;

const kept = new Map<string, BroodEstimate>();

/**
 * Estimates a nest, or gives the estimate that was made from the same input on the same local day: a page that is
 * loaded again need not wait for the same numbers. Another reading, temperature or setting is another digest.
 *
 * @param input with `digest`, so that the keys stay short. Teams share nothing, not even equal numbers.
 */
export function estimateAtHand(
  { team }: Pick<TeamScope, 'team'>,
  input: BroodInput & Required<Pick<BroodInput, 'digest'>>,
): BroodEstimate {
  const key = `${idKey(team)} ${input.nest} ${estimateDigest(input)}`;
  const estimate = kept.get(key) ?? estimateNest(input);
  kept.delete(key);
  kept.set(key, estimate);
  const [oldest] = kept.keys();
  if (kept.size > MOST_KEPT && oldest !== undefined) kept.delete(oldest);
  return { ...estimate, asOf: new Date(input.asOf).toISOString() };
}
