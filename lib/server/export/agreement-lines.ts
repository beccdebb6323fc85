import 'server-only';
import { READING_SCALE } from '@/lib/comb/reading-scale';
import { AGREEMENT_FILE } from '@/lib/csv/agreement-file';
import { writeHeader, writeRow } from '@/lib/csv/write-row';
import { fromBinary } from '@/lib/server/db/uuid-binary';
import { memberNames } from '@/lib/server/queries/member-names';
import type { ReadingPair } from '@/lib/server/queries/reading-pairs';
import { agreementOf } from '@/lib/stats/agreement-of';
import type { ExportCall } from './export-call';
import { type SeenVisit, seenVisits } from './pair-stream';

/** Thousands of pairs leave the house in one go: only intervals that have a formula. */
const SCALE = { ...READING_SCALE, draws: 0 };

function figuresOf({ first, second }: ReadingPair, { cellsOf }: SeenVisit) {
  const found = agreementOf(cellsOf(first.id), cellsOf(second.id), SCALE);
  const { n, leftOut, raw, kappa } = found;
  return {
    compared: n,
    ...leftOut,
    agreed: raw.agreed,
    raw: raw.share,
    rawLow: raw.interval.low,
    rawHigh: raw.interval.high,
    kappa: kappa.value,
    kappaLow: kappa.interval?.low ?? null,
    kappaHigh: kappa.interval?.high ?? null,
    stages: found.kappaLinear.n,
    kappaLinear: found.kappaLinear.value,
    kappaQuadratic: found.kappaQuadratic.value,
    alphaNominal: found.alphaNominal.value,
    alphaOrdinal: found.alphaOrdinal.value,
  };
}

/** `agreement.csv`, line by line. */
export async function* agreementLines(call: ExportCall): AsyncGenerator<string> {
  yield writeHeader(AGREEMENT_FILE, call.form);
  const nameOf = await memberNames(call.scope);
  for await (const seen of seenVisits(call)) {
    const { nest, visit, visitDate } = seen;
    const key = { team: call.ctx.teamName, nest: nest.code, visit: fromBinary(visit.id), visitDate };
    for (const pair of seen.pairs) {
      const { comparison, first, second } = pair;
      const who = {
        firstReading: fromBinary(first.id),
        firstObserver: nameOf(first.opened_by),
        secondReading: fromBinary(second.id),
        secondObserver: nameOf(second.opened_by),
      };
      yield writeRow(AGREEMENT_FILE, { ...key, comparison, ...who, ...figuresOf(pair, seen) }, call.form);
    }
  }
}
