import { liveMarks } from '@/lib/comb/live-marks';
import type { Mark } from '@/lib/comb/mark';
import { type Tally, tallyOf } from '@/lib/comb/tally';
import type { Op } from '@/lib/protocol/op';
import { OP_BODIES } from '@/lib/protocol/op-bodies';
import { demoId } from '@/lib/server/demo/build/demo-id';
import { readingName } from '@/lib/server/demo/build/names';
import { seasonSteps } from '@/lib/server/demo/build/season-steps';
import type { TeamStory } from '@/lib/server/demo/story/team-story';

/** Every operation a team's office received, in the order it arrived. */
export function opsOf(team: TeamStory): Op[] {
  return seasonSteps(team).flatMap((step) => (step.kind === 'push' ? step.ops : []));
}

function markOf({ opId, hlc, at, body }: Op): Mark {
  const { note, instar, reused, scrap, supersedes, ...rest } = OP_BODIES['cell.mark'].parse(body);
  return {
    ...rest,
    opId,
    hlc,
    at: at.wall,
    note: note ?? null,
    instar: instar ?? null,
    reused: reused ?? false,
    scrap: scrap ?? false,
    supersedes: supersedes ?? null,
  };
}

/** The live marks of one reading, folded from the operations. */
export function readingMarks(ops: readonly Op[], reading: string): Mark[] {
  const own = ops.filter((op) => op.reading === reading);
  const retracted = own.filter(({ kind }) => kind === 'cell.retract').map(({ body }) => String(body.target));
  return liveMarks(own.filter(({ kind }) => kind === 'cell.mark').map(markOf), new Set(retracted));
}

/** The id of a reading by nest code, visit and reading key. */
export function readingId(code: string, visit: string, reading: string): string {
  return demoId(readingName({ code }, { key: visit }, { key: reading }));
}

/** Only the counts that are not zero, as a table row would give them. */
export function countsOf(marks: readonly Mark[]): Partial<Tally> {
  return Object.fromEntries(Object.entries(tallyOf(marks)).filter(([, count]) => count > 0));
}
