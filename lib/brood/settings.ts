import { DEFAULT_DURATIONS, type DurationRow } from './durations';
import { DEFAULT_TEMPERATURE, TEMPERATURE_RULES } from './temperature/temperature-settings';
import type { Confusion } from './hmm/emission';
import type { Trust } from './trust';

/** One number of the model, with how far it can be trusted and where it comes from. */
export interface Setting {
  value: number;
  trust: Trust;
  source: string;
}

/** What each number is, in which unit, and the values it may take. */
export interface SettingRule {
  label: string;
  unit: string;
  min: number;
  max: number;
  /** Only whole numbers make sense. */
  isWhole?: true;
}

/** Every number the estimate uses, by name. Variation below 0.05 is refused: it would need thousands of phases. */
export const SETTING_RULES = {
  instar5Share: { label: 'share of the larval time spent as instar 5', unit: '', min: 0.05, max: 0.9 },
  cvEgg: { label: 'individual variation of the egg stage', unit: 'CV', min: 0.05, max: 1 },
  cvInstar: { label: 'individual variation of each larval instar', unit: 'CV', min: 0.05, max: 1 },
  cvCapped: { label: 'individual variation of the capped stage', unit: 'CV', min: 0.05, max: 1 },
  nestFactorCv: { label: 'variation shared by a whole nest', unit: 'CV', min: 0, max: 1 },
  lossEgg: { label: 'loss of eggs', unit: 'per day', min: 0, max: 1 },
  lossLarva: { label: 'loss of larvae', unit: 'per day', min: 0, max: 1 },
  lossCapped: { label: 'loss of capped brood', unit: 'per day', min: 0, max: 1 },
  layFirst: { label: 'laying into a new cell', unit: 'per day', min: 0.01, max: 24 },
  layNext: { label: 'laying into an emptied cell', unit: 'per day', min: 0, max: 24 },
  generations: { label: 'broods that one cell can hold after another', unit: '', min: 1, max: 6, isWhole: true },
  slipFloor: { label: 'share of records that may mean anything', unit: '', min: 0.000001, max: 0.1 },
  cellsPerDay: { label: 'growth of the comb before the first count', unit: 'cells per day', min: 0.05, max: 20 },
  orderSpread: { label: 'how strictly cells are built outwards, at the pedicel', unit: 'cells', min: 0.2, max: 500 },
  orderSpreadPerCell: { label: 'and more for every cell further out', unit: 'cells', min: 0, max: 10 },
  growthSpread: { label: 'how uncertain that growth is, for every cell built since', unit: 'cells', min: 0, max: 2 },
  orderSlip: { label: 'cells of a comb that follow no order', unit: 'cells', min: 0, max: 1 },
  foundingLead: { label: 'from founding to the first egg', unit: 'days', min: 0, max: 30 },
  priorSpan: { label: 'how long before a reading an egg may have been laid', unit: 'days', min: 30, max: 365 },
  forecastSpan: { label: 'how far emergence is forecast', unit: 'days', min: 1, max: 60 },
  amberWindow: { label: 'season gate turns amber before first emergence', unit: 'days', min: 0, max: 60 },
  redWindow: { label: 'season gate turns red before first emergence', unit: 'days', min: 0, max: 60 },
  guardWindow: { label: 'capped nests this close to first emergence are guarded', unit: 'days', min: 0, max: 60 },
  relayWindow: { label: 'capped to egg within this time is asked about', unit: 'days', min: 0, max: 60 },
  ...TEMPERATURE_RULES,
} as const satisfies Record<string, SettingRule>;

/** The name of one number of the model. */
export type SettingName = keyof typeof SETTING_RULES;

/** One version of all numbers behind an estimate. */
export interface BroodSettings {
  /** Names this version in every answer made with it. */
  version: string;
  values: Readonly<Record<SettingName, Setting>>;
  durations: readonly DurationRow[];
  /** How records err, where it is not the built-in matrix: learnt from the team's own double readings. */
  confusion?: HeldConfusion;
  /** What the team's own nests have shown of the durations, by taxon. */
  durationFactors?: readonly DurationFactor[];
}

/** A confusion matrix with where it comes from. */
export interface HeldConfusion {
  rows: Confusion;
  trust: Trust;
  source: string;
}

/** How the nests of a taxon develop relative to its durations: log of the rate is normal over nests. */
export interface DurationFactor {
  taxon: string;
  /** Mean of log rate; above 0 is faster than the durations. */
  logMean: number;
  /** Standard deviation between nests, at least 0. */
  logSd: number;
  trust: Trust;
  source: string;
}

const assumed = (value: number, source: string): Setting => ({ value, trust: 'assumption', source });

const LOSS_SOURCE = 'no published daily loss by stage; order egg > larva > capped only';
const SPREAD_SOURCE = 'no published standard deviation for a temperate species';
const ORDER_SOURCE = 'no published order of cells; oldest brood nearest the founding cell in direction only';
const GATE_SOURCE = 'programme default; owned by the lead biologist';

/** The settings a new team starts with. */
export const DEFAULT_SETTINGS: BroodSettings = {
  version: '2026.2',
  values: {
    instar5Share: assumed(1 / 3, 'no published duration of any instar; instars 1-4 share the rest equally'),
    cvEgg: assumed(0.16, SPREAD_SOURCE),
    cvInstar: assumed(0.42, `${SPREAD_SOURCE}; five instars make 0.192 for the whole larva`),
    cvCapped: assumed(0.16, SPREAD_SOURCE),
    nestFactorCv: assumed(0.2, 'covers unknown temperature, food and species'),
    lossEgg: assumed(0.01, LOSS_SOURCE),
    lossLarva: assumed(0.005, LOSS_SOURCE),
    lossCapped: assumed(0.002, LOSS_SOURCE),
    layFirst: assumed(2, 'read in direction only: an egg is laid as soon as a cell is begun (P. metricus)'),
    layNext: assumed(0.2, 'read in direction only: emptied cells are cleaned and laid in again'),
    generations: assumed(3, 'enough for temperate nests; up to six adults a cell are reported for a tropical species'),
    slipFloor: assumed(0.0001, 'a slip of the hand or a neighbouring cell must not rule a history out'),
    cellsPerDay: assumed(1, '40 to 50 cells at 42 days in the fuscatus group (Enteman 1902) make 0.95 to 1.19 a day'),
    orderSpread: assumed(1.5, ORDER_SOURCE),
    orderSpreadPerCell: assumed(0.1, ORDER_SOURCE),
    growthSpread: assumed(0.15, 'founding nests are read to grow by 0.39 to 1.2 cells a day, about 30 % either way'),
    orderSlip: assumed(
      0.02,
      'combs are started anew, partly lost or recorded in part; place alone must not rule a date out',
    ),
    foundingLead: assumed(1, 'an egg is laid as soon as a cell is begun (P. metricus); the stalk takes about a day'),
    priorSpan: assumed(120, 'longest time an egg is searched for before the first visit'),
    forecastSpan: assumed(60, GATE_SOURCE),
    amberWindow: assumed(7, GATE_SOURCE),
    redWindow: assumed(0, GATE_SOURCE),
    guardWindow: assumed(3, GATE_SOURCE),
    relayWindow: assumed(7, GATE_SOURCE),
    ...DEFAULT_TEMPERATURE,
  },
  durations: DEFAULT_DURATIONS,
};
