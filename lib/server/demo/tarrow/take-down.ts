import 'server-only';
import { type WallTime, minutesBetween, minutesLater } from '@/lib/server/demo/build/demo-time';
import { note, step, visitField } from '@/lib/server/demo/story/acts';
import type { ActStory, VisitStory } from '@/lib/server/demo/story/nest-story';
import type { MeasuredNest } from './moved-nests';
import type { Release } from './releases';

/** A take-down beyond its readings: steps are told, measures and the release come from the season's tables. */
interface TakeDownStory extends Pick<VisitStory, 'by' | 'startedAt' | 'heldUntil' | 'readings'> {
  heightM?: number;
  /** Catching, cutting and what else happened at the nest. */
  steps: readonly ActStory[];
  measuredAt: WallTime;
  measured: Omit<MeasuredNest, 'comb'>;
  release?: Release;
  text: string;
}

/** The measures of a comb and its surroundings, each a field of the visit. */
export function measures(at: WallTime, measured: Omit<MeasuredNest, 'comb'>): ActStory[] {
  const { combMm, pedicelMm, tempC, adults } = measured;
  const values: [string, number | null][] = [
    ['comb_max_mm', combMm[0]],
    ['comb_min_mm', combMm[1]],
    ['pedicel_mm', pedicelMm],
    ['temp_c', tempC],
    ['adult_females', adults],
  ];
  return values.flatMap(([name, value]) => (value === null ? [] : [visitField(at, name, value)]));
}

/** What is written beside a release: minutes from sunset, air, wind, and why it was late. */
export function releaseNote({ releasedAt, sunsetAt, tempC, windKmh, delayedBy }: Release): string {
  const offset = minutesBetween(sunsetAt, releasedAt);
  const when = `${Math.abs(offset)} min ${offset < 0 ? 'before' : 'after'} sunset`;
  return [`${when}, ${tempC} °C, wind ${windKmh} km/h.`, delayedBy].filter(Boolean).join(' ');
}

function releaseSteps(release: Release): ActStory[] {
  const { enclosedAt, firstContactMin, releasedAt } = release;
  return [
    step(enclosedAt, 'into the enclosure'),
    ...firstContactMin.map((min) =>
      step(minutesLater(enclosedAt, min), 'first contact', `On the comb after ${min} min.`),
    ),
    step(releasedAt, 'release', releaseNote(release)),
  ];
}

/** The visit at which a nest is taken down, read, measured, put back and released. */
export function takeDown(story: TakeDownStory): VisitStory {
  const { by, startedAt, heldUntil, readings, heightM, steps, measuredAt, measured, release, text } = story;
  const height = heightM === undefined ? [] : [visitField(startedAt, 'height_m', heightM)];
  const acts = [
    ...height,
    ...steps,
    ...measures(measuredAt, measured),
    note(measuredAt, 'visit', text),
    ...(release ? releaseSteps(release) : []),
  ];
  return { key: 'take-down', purpose: 'take-down', by, startedAt, heldUntil, acts, readings };
}
