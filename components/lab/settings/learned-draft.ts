import type { LearningView } from './settings-shapes';

/** Cells from which on a row of the team's own counts for more than a guess. */
const ENOUGH_CELLS = 100;

/** The confusion rows that were learnt, as a change of the draft. */
export function confusionChange({ confusion, pseudoCount }: LearningView) {
  const rows = confusion.map(({ name, posterior, n }) => {
    const trust = n >= ENOUGH_CELLS ? 'medium' : 'low';
    const source = `own double readings: ${Math.round(n)} cells, on the default row counted as ${pseudoCount}`;
    return [name, { row: posterior, trust, source }] as const;
  });
  return { confusion: Object.fromEntries(rows) };
}

/** The factors that were learnt, as a change of the draft. */
export function factorChange({ durations }: LearningView) {
  return {
    durationFactors: durations.map(({ row, logRate, nests, broods }) => ({
      taxon: row.taxon,
      ...{ logMean: logRate.mean, logSd: logRate.sd, trust: 'low' },
      source: `own nests: ${nests}, with ${broods} broods followed through whole stages`,
    })),
  };
}
