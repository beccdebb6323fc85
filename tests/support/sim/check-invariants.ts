import { foldMarks, liveByCell } from '@/lib/offline/fold-readings';
import { type LocalOp, officeKey, queuedOp } from '@/lib/offline/local-op';
import type { PullRow } from '@/lib/protocol/pull';
import type { MemoryDisk } from './memory-disk';
import type { RunFacts, SavedOp, SimPhone } from './run-facts';

/** A broken promise, named by the invariant of the sync protocol. */
export interface Violation {
  invariant: string;
  what: string;
}

/** The operation on a disk, under its own key or beside one that contradicts it. */
function onDisk(disk: MemoryDisk, opId: string, bodyHash: string): LocalOp | undefined {
  const rows = [disk.ops.get(opId), disk.ops.get(officeKey(opId))];
  return rows.find((row) => row?.op.bodyHash === bodyHash);
}

/** I1: what was shown as saved is on the disk. */
function checkSaved({ saved }: RunFacts, { disk, wiped }: SimPhone): Violation[] {
  if (wiped) return [];
  return [...saved.values()]
    .filter((op) => op.disk === disk && !onDisk(disk, op.opId, op.bodyHash))
    .map((op) => ({ invariant: 'I1', what: `shown as saved but not on the disk: ${op.opId}` }));
}

/** I6: what left the queue is at the office. */
function checkHeld({ server }: RunFacts, { disk }: SimPhone): Violation[] {
  return [...disk.ops.values()]
    .filter((row) => row.state === 'held' && row.epoch === server.epoch && !server.holds(row.op.opId, row.op.bodyHash))
    .map((row) => ({ invariant: 'I6', what: `held, but the office has it not: ${row.key}` }));
}

/** I7: every office row up to the cursor is here. */
function checkCursor({ server }: RunFacts, { disk }: SimPhone): Violation[] {
  const { meta } = disk;
  if (!meta || meta.epoch !== server.epoch) return [];
  return server.data.log
    .filter((row) => row.seq <= meta.cursor && !onDisk(disk, row.opId, row.bodyHash))
    .map((row) => ({ invariant: 'I7', what: `cursor ${meta.cursor} is past row ${row.seq}, which is not here` }));
}

/** What must hold on a phone at every moment, in particular right after a kill. */
export function checkPhone(run: RunFacts, phone: SimPhone): Violation[] {
  return [...checkSaved(run, phone), ...checkHeld(run, phone), ...checkCursor(run, phone)];
}

/** I3, I8: one row an operation, numbers without a gap. */
function checkLog({ server, made }: RunFacts): Violation[] {
  const found: Violation[] = [];
  const ids = new Set<string>();
  server.data.log.forEach((row, index) => {
    if (row.seq !== index + 1) found.push({ invariant: 'I8', what: `row ${index + 1} has seq ${row.seq}` });
    if (ids.has(row.opId)) found.push({ invariant: 'I3', what: `applied twice: ${row.opId}` });
    if (!made.has(`${row.opId} ${row.bodyHash}`)) found.push({ invariant: 'I2', what: `nobody made ${row.opId}` });
    ids.add(row.opId);
  });
  return found;
}

const NOT_FOR_THE_OFFICE = /^(poison|refuse)/;

function reasonOf(row: LocalOp | undefined): string {
  return typeof row?.op.body.reason === 'string' ? row.op.body.reason : '';
}

/** I2, I10, I11: a saved operation is at the office once; one that the office cannot take is still on the phone. */
function checkOne(run: RunFacts, { opId, bodyHash, disk }: SavedOp): Violation | null {
  const { server } = run;
  const aside = server.data.aside.get(`${opId} ${bodyHash}`);
  const inLog = server.row(opId)?.bodyHash === bodyHash;
  if (inLog) return aside ? { invariant: 'I2', what: `in the log and set aside: ${opId}` } : null;
  if (aside?.r === 'quarantined') return null;
  if (aside?.r === 'parked' && run.exempt.size > 0) return null;
  if (aside) return { invariant: 'I2', what: `${aside.r} for ever: ${opId}` };
  const row = onDisk(disk, opId, bodyHash);
  const stays = row?.state === 'suspect' || row?.state === 'refused';
  if (stays && NOT_FOR_THE_OFFICE.test(reasonOf(row))) return null;
  return {
    invariant: run.restores > 0 ? 'I10' : 'I2',
    what: `lost: ${opId} (${row?.kind ?? 'gone'} ${row?.state ?? ''})`,
  };
}

function checkDelivered(run: RunFacts): Violation[] {
  return [...run.saved]
    .filter(([key]) => !run.exempt.has(key))
    .map(([, op]) => checkOne(run, op))
    .filter((violation) => violation !== null);
}

/** I9: what a phone has from the office is what the office has. */
function checkSame({ server }: RunFacts, { disk }: SimPhone): Violation[] {
  const { meta } = disk;
  if (meta?.epoch !== server.epoch || meta.cursor !== server.data.log.length) {
    return [
      {
        invariant: 'I9',
        what: `stands at ${meta?.epoch}:${meta?.cursor}, the office at ${server.epoch}:${server.data.log.length}`,
      },
    ];
  }
  const known = new Map(server.data.log.map((row): [string, PullRow] => [row.opId, row]));
  return [...disk.ops.values()]
    .filter((row) => row.state === 'remote' && known.get(row.op.opId)?.seq !== row.seq)
    .map((row) => ({ invariant: 'I9', what: `the office has no row ${row.seq} ${row.key}` }));
}

/** The live marks of every reading, in a form to compare. */
function comb(rows: readonly LocalOp[]): string[] {
  const readings = new Set(rows.map((row) => row.reading));
  return [...readings]
    .flatMap((reading) => [...liveByCell(foldMarks(rows.filter((row) => row.reading === reading))).values()])
    .map(({ opId, q, r, state }) => `${q},${r} ${state} ${opId}`)
    .sort();
}

/** I9: every phone draws the combs that the office has. What only an emptied phone had may be missing there. */
function checkCombs({ server, exempt }: RunFacts, { disk }: SimPhone): Violation[] {
  if (exempt.size > 0) return [];
  const here = comb([...disk.ops.values()]);
  const there = comb(server.data.log.map((row) => ({ ...queuedOp(row, row.actor, 0), state: 'remote' })));
  return here.join() === there.join() ? [] : [{ invariant: 'I9', what: 'a phone draws another comb than the office' }];
}

/** I11: only operations that the office cannot take are set apart. */
function checkSuspects({ disk }: SimPhone): Violation[] {
  return [...disk.ops.values()]
    .filter((row) => (row.state === 'suspect' || row.state === 'refused') && !NOT_FOR_THE_OFFICE.test(reasonOf(row)))
    .map((row) => ({ invariant: 'I11', what: `${row.state} without a cause: ${row.kind} ${row.key}` }));
}

/** What must hold once the storm is over and everyone has been served. */
export function checkEnd(run: RunFacts): Violation[] {
  const phones = run.phones.flatMap((phone) => [
    ...checkPhone(run, phone),
    ...checkSame(run, phone),
    ...checkCombs(run, phone),
    ...checkSuspects(phone),
  ]);
  return [...checkLog(run), ...checkDelivered(run), ...phones];
}
