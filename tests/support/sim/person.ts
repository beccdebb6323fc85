import { spiral } from '@/lib/comb/walk';
import { EVERYDAY_STATES } from '@/lib/comb/states';
import type { LocalOp } from '@/lib/offline/local-op';
import type { OpRequest } from '@/lib/offline/make-op';
import type { MemoryDisk } from './memory-disk';
import type { World } from './world';

const TROUBLE = ['poison 500', 'poison 400', 'poison 413', 'quarantine', 'refuse'] as const;

const CELLS = spiral(19);

function ownOf(disk: MemoryDisk, kind: string): LocalOp[] {
  return [...disk.ops.values()].filter((row) => row.kind === kind && row.actor === disk.meta?.userId);
}

function openNest(world: World): OpRequest {
  return { kind: 'nest.open', nest: world.id(), visit: null, reading: null, body: { code: `N${world.below(99)}` } };
}

function mark(world: World, reading: LocalOp, marks: readonly LocalOp[]): OpRequest {
  const { q, r } = world.pick(CELLS);
  const before = marks.findLast((row) => row.reading === reading.reading && row.op.body.q === q && row.op.body.r === r);
  const state = world.pick(EVERYDAY_STATES);
  const body = { q, r, state, nectar: world.chance(0.2), unsure: false, supersedes: before?.op.opId };
  return { kind: 'cell.mark', nest: reading.nest, visit: reading.visit, reading: reading.reading, body };
}

/** What a person does next, given what the phone shows: opens what is missing, then reads cells and changes their mind. */
export function nextDeed(world: World, disk: MemoryDisk, poison: number): OpRequest {
  const nests = ownOf(disk, 'nest.open');
  const visits = ownOf(disk, 'visit.open');
  const readings = ownOf(disk, 'reading.open');
  if (nests.length === 0) return openNest(world);
  const { nest } = world.pick(nests);
  if (world.chance(poison)) {
    const body = { entity: 'nest', reason: world.pick(TROUBLE) };
    return { kind: 'entity.archive', nest, visit: null, reading: null, body };
  }
  if (visits.length === 0) {
    const body = { purpose: 'check' as const, startedAt: '2026-06-16T05:00:00-04:00' };
    return { kind: 'visit.open', nest, visit: world.id(), reading: null, body };
  }
  if (readings.length === 0) {
    const { visit, nest: of } = world.pick(visits);
    return { kind: 'reading.open', nest: of, visit, reading: world.id(), body: { kind: 'field', source: 'phone' } };
  }
  const reading = world.pick(readings);
  const marks = ownOf(disk, 'cell.mark');
  if (marks.length > 3 && world.chance(0.15)) {
    const { op, visit, reading: within } = world.pick(marks);
    return { kind: 'cell.retract', nest: op.nest, visit, reading: within, body: { target: op.opId } };
  }
  return mark(world, reading, marks);
}
