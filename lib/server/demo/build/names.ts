import 'server-only';
import type { NestStory, VisitStory } from '@/lib/server/demo/story/nest-story';
import type { Person } from '@/lib/server/demo/story/person';
import type { ReadingStory } from '@/lib/server/demo/story/reading-story';
import type { TeamStory } from '@/lib/server/demo/story/team-story';
import { demoId } from './demo-id';

/** The name a nest's ids are made from. */
export function nestName({ code, idName }: Pick<NestStory, 'code' | 'idName'>): string {
  return `nest/${idName ?? code}`;
}

/** The name a visit's ids are made from. */
export function visitName(nest: Pick<NestStory, 'code' | 'idName'>, visit: Pick<VisitStory, 'key'>): string {
  return `${nestName(nest)}/visit/${visit.key}`;
}

/** The name a reading's ids are made from. */
export function readingName(
  nest: Pick<NestStory, 'code' | 'idName'>,
  visit: Pick<VisitStory, 'key'>,
  reading: Pick<ReadingStory, 'key'>,
): string {
  return `${visitName(nest, visit)}/reading/${reading.key}`;
}

/** A demo team's id. */
export function teamId(team: Pick<TeamStory, 'key'>): string {
  return demoId(`team/${team.key}`);
}

/** A demo person's user id. */
export function userId(person: Pick<Person, 'email'>): string {
  return demoId(`user/${person.email}`);
}

/** The id of the phone or desk computer that a demo person recorded with. */
export function deviceId(person: Pick<Person, 'email'>): string {
  return demoId(`device/${person.email}`);
}

/** The id of a nest's outcome. */
export function outcomeId(nest: Pick<NestStory, 'code' | 'idName'>): string {
  return demoId(`${nestName(nest)}/outcome`);
}
