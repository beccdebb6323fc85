import { localDate } from '@/lib/kit/local-date';
import { STATE_WORDS } from '@/lib/comb/states';
import type { BroodFlag, FlagCode } from './answer';
import { type CellView, type Sighting, isRestart } from './cell-history';
import type { DurationRow } from './durations';
import type { BroodSettings } from './settings';
import { DAY_MS } from './date-range';
import { STAGES, type StageGroup, fitsInstar, stageGroup, stageLaws } from './stages';

/** Progress this much faster than the mean of the stages in between is asked about. */
const FASTEST = 0.5;
/** Progress this much slower than the mean of all stages concerned is asked about. */
const SLOWEST = 2;

/** Two looks into one cell, the later one last. */
interface Change {
  from: StageGroup;
  /** Null when the later look showed no living brood. */
  to: StageGroup | null;
  later: Sighting;
  days: number;
}

/** What the expected days of stages come from. */
interface StageDays {
  row: DurationRow;
  settings: BroodSettings;
}

/** A finding without its cell and dates. */
interface Finding {
  code: FlagCode;
  text: string;
}

/** Mean days of the stages `first` to `last`; none when `last` comes before `first`. */
function meanDays(model: StageDays, first: number, last: number): number {
  return stageLaws(model.row, model.settings)
    .slice(first, last + 1)
    .reduce((sum, stage) => sum + stage.meanDays, 0);
}

function backFromCapped({ to, days, later }: Change, model: StageDays): Finding | null {
  if (later.mark.reused || later.mark.state === 'opened') return null;
  if (to?.key === 'egg' && days <= model.settings.values.relayWindow.value) {
    return {
      code: 'capped-to-egg',
      text: 'Capped before, an egg now, and no opened cell seen in between. An adult may have left, or one look slipped.',
    };
  }
  if (to && to.key !== 'egg' && days < meanDays(model, 0, to.first - 1) * FASTEST) {
    return {
      code: 'step-back',
      text: 'Capped before, a larva now: too soon for a new one. One of the two looks slipped.',
    };
  }
  return {
    code: 'capped-gone',
    text: 'The cap is gone and no opened cell was seen: an adult came out, or the brood was lost.',
  };
}

function tooFast(text: string): Finding {
  return { code: 'too-fast', text: `${text} in so few days is faster than any brood is expected to be. Look again.` };
}

function onward({ from, to, days }: Change & { to: StageGroup }, model: StageDays): Finding | null {
  if (to.last < from.first) {
    return { code: 'step-back', text: 'Younger now than before. Most likely one of the two looks slipped by a class.' };
  }
  if (days < meanDays(model, from.last + 1, to.first - 1) * FASTEST) return tooFast(`From ${from.key} to ${to.key}`);
  if (days <= meanDays(model, from.first, to.last) * SLOWEST) return null;
  return { code: 'too-slow', text: 'Hardly older after so many days: the brood seen before was probably replaced.' };
}

/** What is surprising about the last two looks into a cell; null when nothing is. */
function judge(change: Change, model: StageDays): Finding | null {
  const { from, to, later, days } = change;
  if (from.key === 'capped' && to?.key !== 'capped') {
    return later.mark.state === 'dead' || later.mark.state === 'parasitised' ? null : backFromCapped(change, model);
  }
  if (later.mark.state === 'opened' && days < meanDays(model, from.last + 1, STAGES.length - 1) * FASTEST) {
    return tooFast(`From ${from.key} to opened`);
  }
  if (!to) return null;
  if (isRestart(from, to)) {
    return {
      code: 'relaid',
      text: 'A larva before, an egg now: the larva was lost and she laid again. Dates are for the new egg.',
    };
  }
  return onward({ ...change, to }, model);
}

function lastChange({ looked }: CellView): Change | null {
  const [earlier, later] = looked.slice(-2);
  const from = earlier ? stageGroup(earlier.mark) : null;
  if (!earlier || !later || !from) return null;
  return { from, to: stageGroup(later.mark), later, days: (later.at - earlier.at) / DAY_MS };
}

/** The flags of one cell, judged by its last two looks. Nothing is refused for being surprising. */
export function cellFlags(view: CellView, model: StageDays, zone: string): BroodFlag[] {
  const cell = { q: view.q, r: view.r };
  const change = lastChange(view);
  const findings = [change ? judge(change, model) : null];
  const last = view.looked.at(-1);
  if (view.brood && view.state !== last?.mark.state) {
    const seen = localDate(view.brood.at, zone);
    const text = `Recorded as ${STATE_WORDS[view.state]}, so not looked into; dates are from the look on ${seen}.`;
    findings.push({ code: 'not-looked-at', text });
  }
  if (last && !fitsInstar(last.mark)) {
    const text = `Instar ${last.mark.instar} does not belong to ${STATE_WORDS[last.mark.state]}; the class was used.`;
    findings.push({ code: 'instar-mismatch', text });
  }
  return findings.flatMap((finding) => (finding ? [{ cell, ...finding }] : []));
}
