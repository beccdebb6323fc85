import { type Axial, cellKey } from '@/lib/comb/axial';
import type { CellState } from '@/lib/comb/states';
import type { BroodEstimate, CellEstimate } from './answer';
import { type CellLook, cellLooks } from './cell-looks';
import type { BroodReading } from './input';
import { type StagePlace, stagePlaces } from './stage-places';

/** What one cell is likely to hold on the day an estimate speaks for. */
export interface ExpectedCell extends Axial {
  state: CellState;
}

/** A cell seen in a class was not at its very edge: this share of the class is kept from either end. */
const EDGE = 0.1;

/** The three median instants of a brood, epoch milliseconds; null when one of them is not known. */
function medians({ laid, capped, emerges }: CellEstimate) {
  if (!laid || !capped || !emerges) return null;
  const [begun, closed, out] = [laid, capped, emerges].map(({ utc }) => Date.parse(utc.median));
  return begun !== undefined && closed !== undefined && out !== undefined && begun < closed && closed < out
    ? { begun, closed, out }
    : null;
}

/** Days of mean age a brood has at an instant, by its medians. */
function ageAt(at: number, { begun, closed, out }: NonNullable<ReturnType<typeof medians>>, cap: StagePlace): number {
  if (at < closed) return ((at - begun) / (closed - begun)) * cap.from;
  return cap.from + ((at - closed) / (out - closed)) * (cap.to - cap.from);
}

/** Moves a brood on from what was seen: never back, and as fast as its own dates say. */
function grown(cell: CellEstimate, look: CellLook, { places, asOf }: { places: readonly StagePlace[]; asOf: number }) {
  const dates = medians(cell);
  const seen = places.find(({ state }) => state === look.state);
  const cap = places.find(({ state }) => state === 'capped');
  if (!dates || !seen || !cap || look.state === 'opened') return look.state;
  const room = (seen.to - seen.from) * EDGE;
  const age = Math.min(seen.to - room, Math.max(seen.from + room, ageAt(look.at, dates, cap)));
  const speed = cap.to / (dates.out - dates.begun);
  const now = age + Math.max(0, asOf - look.at) * speed;
  return places.find(({ to }) => now < to)?.state ?? look.state;
}

/**
 * What each cell is likely to hold on the day an estimate speaks for: the class it was last seen in, moved on by the
 * days since. A cell without living brood is expected unchanged, one that nobody has looked into is left out.
 *
 * @param readings those the estimate was made from.
 */
export function expectedToday(estimate: BroodEstimate, readings: readonly BroodReading[]): ExpectedCell[] {
  const asOf = Date.parse(estimate.asOf);
  const places = stagePlaces(estimate.durations);
  const looks = cellLooks(readings.filter(({ at }) => at <= asOf));
  return estimate.cells.flatMap((cell) => {
    const look = looks.get(cellKey(cell))?.at(-1);
    return look ? [{ q: cell.q, r: cell.r, state: grown(cell, look, { places, asOf }) }] : [];
  });
}
