import 'server-only';
import type { WallTime } from '@/lib/server/demo/build/demo-time';
import { field, note } from '@/lib/server/demo/story/acts';
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
  text: string;
}

/** A check visit. */
export function check({ key, by, at, adults, text }: CheckStory): VisitStory {
  const counted = adults === undefined ? [] : [field(at, 'visit', 'adult_females', adults)];
  return { key, purpose: 'check', by, startedAt: at, acts: [...counted, note(at, 'visit', text)], readings: [] };
}
