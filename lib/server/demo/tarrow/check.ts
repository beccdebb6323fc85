import 'server-only';
import { type WallTime, minutesLater } from '@/lib/server/demo/build/demo-time';
import { load, note, visitField } from '@/lib/server/demo/story/acts';
import type { VisitStory } from '@/lib/server/demo/story/nest-story';
import type { Person } from '@/lib/server/demo/story/person';

/** A dated look at a nest: who was on it, and one note. */
interface CheckStory {
  /** The name of the check in the schedule, such as `dawn` or `day 7`. */
  key: string;
  by: Person;
  at: WallTime;
  /** Adult females seen; left out where nobody counted. */
  adults?: number;
  /** What she brought home while she was watched. */
  loads?: readonly ('prey return' | 'pulp return')[];
  text: string;
}

/** A check visit. */
export function check({ key, by, at, adults, loads = [], text }: CheckStory): VisitStory {
  const counted = adults === undefined ? [] : [visitField(at, 'adult_females', adults)];
  const homecomings = loads.map((kind, i) => load(minutesLater(at, 3 + 4 * i), kind));
  const acts = [...counted, ...homecomings, note(at, 'visit', text)];
  return { key, purpose: 'check', by, startedAt: at, acts, readings: [] };
}
