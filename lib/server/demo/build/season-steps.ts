import 'server-only';
import type { Op } from '@/lib/protocol/op';
import type { DecisionStory, NestStory } from '@/lib/server/demo/story/nest-story';
import type { Person } from '@/lib/server/demo/story/person';
import type { TeamStory } from '@/lib/server/demo/story/team-story';
import { demoId } from './demo-id';
import { instantOf } from './demo-time';
import { deviceId, readingName } from './names';
import { nestDrafts } from './nest-drafts';
import { sealOps } from './seal-ops';

/** One batch that reached the office. */
export interface PushStep {
  kind: 'push';
  atMs: number;
  by: Person;
  ops: Op[];
}

/** One act of the lab on a reading. */
export interface DecideStep {
  kind: 'decide';
  atMs: number;
  by: Person;
  /** The source reading's id. */
  reading: string;
  decision: DecisionStory;
}

/** Something that happened at the office, in the order it happened. */
export type SeasonStep = PushStep | DecideStep;

/** What one person's device sent, batch by batch. */
function pushesOf(person: Person, { nests, offset }: TeamStory): PushStep[] {
  const drafts = nests.flatMap((nest) => nestDrafts(nest, offset)).filter(({ by }) => by === person);
  const batches = new Map<number, Op[]>();
  for (const { op, sentMs } of sealOps(drafts, { id: deviceId(person), offset })) {
    batches.set(sentMs, [...(batches.get(sentMs) ?? []), op]);
  }
  return [...batches].map(([atMs, ops]) => ({ kind: 'push', atMs, by: person, ops }));
}

function decisionsOf(nest: NestStory, offset: string): DecideStep[] {
  return nest.decisions.map((decision) => ({
    kind: 'decide',
    atMs: instantOf(decision.at, offset),
    by: decision.by,
    reading: demoId(readingName(nest, { key: decision.visit }, { key: decision.reading })),
    decision,
  }));
}

/** Everything that reached a team's office in the season, in order of time; the same at every call. */
export function seasonSteps(team: TeamStory): SeasonStep[] {
  const pushes = team.people.flatMap((person) => pushesOf(person, team));
  const decisions = team.nests.flatMap((nest) => decisionsOf(nest, team.offset));
  return [...pushes, ...decisions].sort((a, b) => a.atMs - b.atMs);
}
