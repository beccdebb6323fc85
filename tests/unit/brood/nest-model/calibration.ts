import { type Random, seededRandom } from '@/lib/kit/random';
import { GENUS_ROW } from '@/lib/brood/durations';
import type { Confusion } from '@/lib/brood/hmm/emission';
import { DEFAULT_SETTINGS } from '@/lib/brood/settings';
import { type TimeLaw, lawAt } from '@/lib/brood/time-law';
import { broodModel } from '@/lib/brood/nest-model/brood-model';
import { buildingPrior, combCurve } from '@/lib/brood/nest-model/building';
import { type Look, likelihoods, looksText } from '@/lib/brood/nest-model/cell-evidence';
import { futureOf } from '@/lib/brood/nest-model/cell-outlook';
import { mixedGroup } from '@/lib/brood/nest-model/mixed-group';
import { nestPosterior } from '@/lib/brood/nest-model/nest-posterior';
import { timelineOf } from '@/lib/brood/nest-model/timeline';
import { settingsWith } from '@/tests/unit/brood/support';
import { type TrueCell, broodAt, classAt, recorded, simulateCell } from './simulate-cell';

const LOOKS = [0, 7.3, 13.8, 21.1];
const LAST = 21.1;
const FIRST_COUNT = 14;
/** Rank and spread of the cells of a nest. */
const CELLS = [
  { rank: 1, spread: 1.6, slip: 0 },
  { rank: 8, spread: 2.3, slip: 0 },
];
const PRIOR_DAYS = 45;
const SD = Math.sqrt(Math.log1p(0.2 ** 2));
const calendar = () => 1;

/** The long run takes the settings of the product; the short one fewer phases, which is the same code on fewer states. */
const SETTINGS =
  process.env.LONG === '1' ? DEFAULT_SETTINGS : settingsWith({ cvEgg: 0.25, cvInstar: 0.6, cvCapped: 0.25 });

/** How a calibration is made: by which errors the records come about, and which ones the analysis believes in. */
export interface Calibration {
  truth: Confusion;
  believed: Confusion;
  seed: number;
}

const normal = (random: Random) => Math.sqrt(-2 * Math.log(1 - random())) * Math.cos(2 * Math.PI * random());

/** A day of building out of the prior: logistic in the number of cells, not before the clock starts. */
function builtDay(random: Random, { rank, spread }: { rank: number; spread: number }): number {
  for (;;) {
    const u = random();
    const cells = rank - 0.5 + spread * Math.log(u / (1 - u));
    const day = cells - FIRST_COUNT;
    // After the first look the comb of these nests goes on growing by a cell a day.
    if (day > -PRIOR_DAYS) return day;
  }
}

const curve = combCurve(
  [0, 400].map((day) => ({ day, cells: FIRST_COUNT + day })),
  1,
);
const timeline = timelineOf(LOOKS, PRIOR_DAYS, calendar);
const priors = CELLS.map((cell) => buildingPrior(timeline, curve, cell));
const futures = LOOKS.map((from) => futureOf({ from, clockEnd: -Infinity, horizon: 110 }, calendar));

/** Places of the truth in the estimated laws: laying and capping of one living brood of the nest. */
export interface Places {
  laid: number | null;
  capped: number | null;
}

function placeIn(law: TimeLaw | undefined, time: number | null | undefined): number | null {
  return law && time !== null && time !== undefined ? lawAt(law, time) : null;
}

function looksAt(random: Random, cell: TrueCell, truth: Confusion): Look[][] {
  const floor = SETTINGS.values.slipFloor.value;
  return LOOKS.map((day) => {
    const state = recorded(random, { confusion: truth, floor }, classAt(cell, day)) as Look['state'];
    return [{ state, instar: null, unsure: false, reused: false }];
  });
}

/** Draws a nest out of the priors, analyses its records, and compares with the truth. */
function calibrateOnce(random: Random, { truth, believed }: Calibration): Places {
  const rho = Math.exp(SD * normal(random));
  const life = { row: GENUS_ROW, settings: SETTINGS, rho };
  const cells = CELLS.map((cell) => simulateCell(random, life, builtDay(random, cell)));
  const chosen = Math.floor(random() * cells.length);
  const brood = cells[chosen] ? broodAt(cells[chosen], LAST) : null;
  if (!brood) return { laid: null, capped: null };
  const model = broodModel(GENUS_ROW, SETTINGS, believed);
  const floor = SETTINGS.values.slipFloor.value;
  const groups = cells.flatMap((cell, i) => {
    const looks = looksAt(random, cell, truth);
    const prior = priors[i];
    return prior ? [{ record: looksText(looks), prior, seen: likelihoods(model, looks, floor), cells: 1 }] : [];
  });
  const { nodes } = nestPosterior(model, { mean: 0, sd: SD }, { timeline, groups, futures });
  const future = futures.at(-1);
  const times = {
    edges: timeline.edges,
    lastLook: LAST,
    future: future ?? futureOf({ from: LAST, clockEnd: 0, horizon: 9 }, calendar),
  };
  const { present } = mixedGroup(model, { nodes, group: chosen }, times);
  return { laid: placeIn(present?.laid, brood.laid), capped: placeIn(present?.capped, brood.capped) };
}

/** Collects so many places of laying and of capping. */
export function calibrate(calibration: Calibration, count: number): { laid: number[]; capped: number[] } {
  const random = seededRandom(calibration.seed);
  const places: { laid: number[]; capped: number[] } = { laid: [], capped: [] };
  while (places.laid.length < count || places.capped.length < count) {
    const { laid, capped } = calibrateOnce(random, calibration);
    if (laid !== null) places.laid.push(laid);
    if (capped !== null) places.capped.push(capped);
  }
  return { laid: places.laid.slice(0, count), capped: places.capped.slice(0, count) };
}

/** χ² of places against even spread over 20 bins. */
export function chiSquare(places: readonly number[]): number {
  const bins = Array<number>(20).fill(0);
  for (const place of places) {
    const bin = Math.min(19, Math.floor(place * 20));
    bins[bin] = (bins[bin] ?? 0) + 1;
  }
  const expected = places.length / 20;
  return bins.reduce((sum, count) => sum + (count - expected) ** 2 / expected, 0);
}

/** Share of places within the central interval of a mass. */
export function coverage(places: readonly number[], mass: number): number {
  return places.filter((place) => Math.abs(place - 0.5) <= mass / 2).length / places.length;
}
