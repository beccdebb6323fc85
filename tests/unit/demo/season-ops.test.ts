import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { compareHlc } from '@/lib/kit/hlc';
import { localParts } from '@/lib/kit/local-date';
import { isUuidText } from '@/lib/kit/uuid';
import { MAX_DEPS, MAX_OPS_PER_PUSH } from '@/lib/protocol/limits';
import { OP_KINDS, type Op, type OpKind } from '@/lib/protocol/op';
import { OP_BODIES } from '@/lib/protocol/op-bodies';
import { hashedText } from '@/lib/protocol/op-hash';
import { type PushStep, seasonSteps } from '@/lib/server/demo/build/season-steps';
import { SEASON } from '@/lib/server/demo/season';
import { may } from '@/lib/server/policies/may';
import { opsOf } from './fold-ops';

const isKind = (kind: string): kind is OpKind => (OP_KINDS as readonly string[]).includes(kind);

/** Ids an operation needs to find at the office. */
function needsOf({ kind, nest, visit, reading, deps }: Op): string[] {
  const entities = { 'nest.open': [], 'visit.open': [nest], 'reading.open': [nest, visit] }[kind] ?? [
    nest,
    visit,
    reading,
  ];
  return [...entities, ...deps].filter((id): id is string => id !== null);
}

/** Ids that the office knows once an operation is there. */
function bringsOf({ opId, kind, nest, visit, reading }: Op): (string | null)[] {
  return [
    opId,
    kind === 'nest.open' ? nest : null,
    kind === 'visit.open' ? visit : null,
    kind === 'reading.open' ? reading : null,
  ];
}

describe.each(SEASON.map((team) => [team.name, team] as const))('the operations of %s', (_name, team) => {
  const steps = seasonSteps(team);
  const pushes = steps.filter((step): step is PushStep => step.kind === 'push');
  const ops = pushes.flatMap((step) => step.ops);

  it('all have a body of their kind', () => {
    for (const op of ops) {
      expect(isKind(op.kind), op.kind).toBe(true);
      if (isKind(op.kind)) expect(OP_BODIES[op.kind].safeParse(op.body).error, `${op.kind} ${op.opId}`).toBeUndefined();
    }
  });

  it('all carry the SHA-256 of their hashed text', () => {
    const wrong = ops.filter((op) => createHash('sha256').update(hashedText(op), 'utf8').digest('hex') !== op.bodyHash);
    expect(wrong).toEqual([]);
  });

  it('are the same every time they are built', () => {
    expect(JSON.stringify(seasonSteps(team))).toBe(JSON.stringify(steps));
  });

  it('each have an id of their own', () => {
    expect(new Set(ops.map(({ opId }) => opId)).size).toBe(ops.length);
    expect(ops.flatMap(needsOf).every(isUuidText)).toBe(true);
  });

  it('arrive in an order in which none waits for another', () => {
    const known = new Set<string | null>();
    for (const { ops: batch } of pushes) {
      for (const op of [...batch].sort((a, b) => a.n - b.n)) {
        expect(
          needsOf(op).filter((id) => !known.has(id)),
          `${op.kind} ${op.at.wall}`,
        ).toEqual([]);
        for (const id of bringsOf(op)) known.add(id);
      }
    }
  });

  it('come in batches within the limits, after they were recorded and within the season', () => {
    for (const { atMs, ops: batch } of pushes) {
      expect(batch.length).toBeLessThanOrEqual(MAX_OPS_PER_PUSH);
      for (const { at, deps } of batch) {
        expect(Date.parse(at.wall)).toBeLessThan(atMs);
        expect(atMs - Date.parse(at.wall)).toBeLessThan(4 * 3_600_000);
        expect(deps.length).toBeLessThanOrEqual(MAX_DEPS);
      }
    }
  });

  it('carry the wall time of the team’s zone', () => {
    for (const { at } of ops) {
      const { date, time } = localParts(Date.parse(at.wall), team.zone);
      expect(at.wall.slice(0, 16)).toBe(`${date}T${time}`);
    }
  });

  it('count up on each device: number, clock and the time since boot', () => {
    for (const device of new Set(ops.map(({ deviceId }) => deviceId))) {
      const own = ops.filter(({ deviceId }) => deviceId === device).sort((a, b) => a.n - b.n);
      expect(own.map(({ n }) => n)).toEqual(own.map((_, i) => i + 1));
      own.slice(1).forEach((op, i) => {
        const before = own[i];
        if (!before) return;
        expect(compareHlc(before.hlc, op.hlc)).toBeLessThan(0);
        if (before.at.boot === op.at.boot) expect(op.at.mono).toBeGreaterThanOrEqual(before.at.mono);
      });
    }
  });

  it('come from people who may push, and reviewers decide', () => {
    for (const step of steps) {
      expect(may(step.by.role, step.kind === 'push' ? 'sync.push' : 'readings.settle'), step.by.name).toBe(true);
    }
  });

  it('mark only in readings that the same person opened', () => {
    const openedBy = new Map(ops.filter(({ kind }) => kind === 'reading.open').map((op) => [op.reading, op.deviceId]));
    const foreign = ops.filter(({ reading, deviceId }) => reading !== null && openedBy.get(reading) !== deviceId);
    expect(foreign).toEqual([]);
  });

  it('set each field and note of an entity once, so that none stands in conflict', () => {
    const registers = ops
      .filter(({ kind }) => kind === 'field.set' || kind === 'note.set')
      .map(({ nest, visit, reading, body }) => [nest, visit, reading, body.entity, body.field ?? 'note'].join(' '));
    expect(registers.filter((name, i) => registers.indexOf(name) !== i)).toEqual([]);
  });
});

describe('the two teams', () => {
  it('share the ids of one nest, its visit, its readings and its first marks', () => {
    const [tarrow = [], ossle = []] = SEASON.map(opsOf);
    const own = new Set(tarrow.flatMap(({ opId, nest, visit, reading }) => [opId, nest, visit, reading]));
    const shared = (pick: (op: Op) => string | null) =>
      new Set(ossle.map(pick).filter((id) => id !== null && own.has(id))).size;
    expect([shared((op) => op.nest), shared((op) => op.visit), shared((op) => op.reading)]).toEqual([1, 1, 2]);
    expect(shared((op) => (op.kind === 'cell.mark' ? op.opId : null))).toBe(18);
  });

  it('share no text of their nests', () => {
    const [tarrow = [], ossle = []] = SEASON.map(({ nests }) => nests.flatMap(({ code, name }) => [code, name]));
    expect(ossle.filter((text) => tarrow.includes(text))).toEqual([]);
  });
});
