import { v7 } from 'uuid';
import { beforeAll, describe, expect, it } from 'vitest';
import type { Op } from '@/lib/protocol/op';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';
import { pushAs } from '@/tests/support/push/push-as';
import { wireOp } from '@/tests/support/wire/wire-op';

const WRITERS = 50;

let team: TestTeam;

beforeAll(async () => {
  team = await makeTeam();
});

function nests(count: number): Op[] {
  return Array.from({ length: count }, (_, index) =>
    wireOp({ kind: 'nest.open', nest: v7(), body: { code: `N${index}` } }),
  );
}

async function log() {
  return database().models.Op.findAll({ where: { team_id: toBinary(team.teamId) }, order: ['seq'] });
}

describe('many writers of one team at once', () => {
  it('leave a log without gaps, and every answer names a place of its own (I8, F47)', async () => {
    const batches = Array.from({ length: WRITERS }, (_, index) => nests(1 + (index % 3)));
    const answers = await Promise.all(batches.map((ops) => pushAs(team, team.members.technician, ops)));
    const seqs = answers.flat().map(({ r, seq }) => (r === 'applied' ? seq : r));
    const rows = await log();
    expect(rows.map(({ seq }) => seq)).toEqual(rows.map((_, index) => index + 1));
    expect([...seqs].sort((a, b) => Number(a) - Number(b))).toEqual(rows.map(({ seq }) => seq));
    for (const answer of answers) {
      const [first = 0] = answer.map(({ seq }) => seq);
      expect(answer.map(({ seq }) => seq)).toEqual(answer.map((_, index) => Number(first) + index));
    }
  });

  it('that send the same batch at the same moment apply it once (F04, F20)', async () => {
    const ops = nests(5);
    const before = (await log()).length;
    const answers = await Promise.all(Array.from({ length: 10 }, () => pushAs(team, team.members.technician, ops)));
    expect((await log()).length).toBe(before + 5);
    const outcomes = answers.flat().map(({ r }) => r);
    expect(outcomes.filter((r) => r === 'applied')).toHaveLength(5);
    expect(outcomes.filter((r) => r === 'duplicate')).toHaveLength(45);
    for (const [index, op] of ops.entries()) {
      const places = new Set(answers.map((answer) => answer[index]?.seq));
      expect(places.size, op.opId).toBe(1);
    }
  });
});
