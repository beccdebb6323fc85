import 'server-only';
import { parseStrictJson } from '@/lib/protocol/strict-json';
import { validateOp } from '@/lib/protocol/validate-op';
import type { Aside } from './aside';
import type { Candidate, Outcome } from './candidate';
import { loadKnown } from './load-known';
import { type ParkedRow, type ParkedText, loadTexts, takeTouched } from './parked-rows';
import { type PushRun, type Waiting, applyAll } from './push-run';
import { sha256Hex } from './raw-op';

/** Notes on its row what became of a parked operation. */
function concludeRow(aside: Aside, id: string, outcome: Outcome): void {
  if (outcome.r === 'applied' || outcome.r === 'duplicate') aside.settleId(id);
  else
    aside.change(id, { state: outcome.r, code: outcome.code, missing: outcome.r === 'parked' ? outcome.missing : [] });
}

/** A parked operation as a candidate; null when it turned out to be faulty, which is noted. */
function candidateOf({ id, raw, by, receivedMs }: ParkedText, aside: Aside): Candidate | null {
  const parsed = parseStrictJson(raw);
  const checked = parsed.ok ? validateOp(parsed.value.value, sha256Hex) : null;
  if (checked?.ok) {
    const conclude = (outcome: Outcome) => concludeRow(aside, id, outcome);
    return { op: checked.value, by, receivedMs, deviceId: null, batchFlags: [], conclude };
  }
  if (checked) aside.change(id, { state: checked.error.r, code: checked.error.code, missing: [] });
  return null;
}

/**
 * Tries parked operations again as soon as something they wait for has arrived, until nothing moves any more.
 *
 * @param waiting operations of this push that wait themselves; a revived one may be what they wait for.
 * @returns what still waits.
 */
export async function reviveParked(
  run: PushRun,
  { parked, waiting, aside }: { parked: Map<string, ParkedRow>; waiting: Waiting[]; aside: Aside },
): Promise<Waiting[]> {
  let still = waiting;
  for (;;) {
    const touched = takeTouched(parked, run.arrived);
    if (touched.length === 0) return still;
    const texts = await loadTexts(run.ctx, touched, run.transaction);
    const revived = texts.flatMap((text) => candidateOf(text, aside) ?? []);
    await loadKnown(
      run,
      revived.map(({ op }) => op),
    );
    still = applyAll(run, [...revived, ...still.map(({ candidate }) => candidate)]);
  }
}
