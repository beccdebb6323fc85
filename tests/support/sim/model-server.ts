import type { NetworkAnswer, NetworkRequest } from '@/lib/offline/network';
import type { Op } from '@/lib/protocol/op';
import type { PullRow } from '@/lib/protocol/pull';
import type { PushOutcome, PushResult } from '@/lib/protocol/push';

/** What a restore brings back. */
interface Data {
  log: PullRow[];
  /** Parked, quarantined and conflicting operations by id and hash. */
  aside: Map<string, { op: Op; r: PushOutcome; code: string }>;
  /** Device id → user id. */
  devices: Map<string, string>;
}

/** Ways to build the office wrongly, to find out whether the checks would notice. */
export type ServerFault = 'no-dedupe' | 'ack-before-commit' | 'cursor-by-start-order';

/** Small pages, so that a short log already has many. */
const PAGE = 9;

/** A word in an operation's text that makes the office stumble over the whole request. */
const STUMBLES: Readonly<Record<string, number>> = { 'poison 500': 500, 'poison 400': 400, 'poison 413': 413 };

function asideKey(op: Op): string {
  return `${op.opId} ${op.bodyHash}`;
}

function reasonOf(op: Op): string {
  return typeof op.body.reason === 'string' ? op.body.reason : '';
}

/** An answer in JSON. */
export function jsonAnswer(status: number, body: object): NetworkAnswer {
  const contentType = status < 400 ? 'application/json' : 'application/problem+json';
  return { kind: 'answer', status, contentType, text: JSON.stringify(body), retryAfterMs: null };
}

/**
 * A small office that keeps the protocol: one counter a team, per-operation results, ids told apart by body hash,
 * parked operations, an epoch, backups and restores. It is the reference that the phones are compared with.
 */
export class ModelServer {
  epoch = 1;
  data: Data = { log: [], aside: new Map(), devices: new Map() };
  backups: { data: Data; seq: number }[] = [];
  /** Users whose session has run out. */
  signedOut = new Set<string>();
  /** Rows that were given a number but are not committed yet (only with `cursor-by-start-order`). */
  private hidden = new Set<string>();

  constructor(
    readonly now: () => number,
    readonly later: (ms: number, fire: () => void) => void,
    readonly fault: ServerFault | null = null,
  ) {}

  /** Highest `seq` that every backup holds. */
  get safeSeq(): number {
    return this.backups.length === 0 ? 0 : Math.min(...this.backups.map(({ seq }) => seq));
  }

  /** Answers a request of a user. `commit` is false when the office dies before its transaction ends. */
  handle(request: NetworkRequest, user: string, commit = true): NetworkAnswer {
    const [path = '', query = ''] = request.path.split('?');
    if (path === '/api/health') return jsonAnswer(200, { ok: true, db: true, photos: true, epoch: this.epoch });
    if (this.signedOut.has(user)) return jsonAnswer(401, { code: 'signin' });
    if (path === '/api/sync/v1/enrol') return this.enrol(user, commit);
    if (this.data.devices.get(request.deviceId ?? '') !== user) return jsonAnswer(403, { code: 'device-revoked' });
    if (path === '/api/sync/v1/push') return this.push(request.body ?? '', user, commit);
    if (path === '/api/sync/v1/have') return this.have(request.body ?? '');
    return this.pull(new URLSearchParams(query).get('cursor') ?? '');
  }

  /** Everything the office holds of an operation id: in the log, or set aside with this hash. */
  holds(opId: string, bodyHash: string): boolean {
    return this.row(opId)?.bodyHash === bodyHash || this.data.aside.has(`${opId} ${bodyHash}`);
  }

  row(opId: string): PullRow | undefined {
    return this.data.log.find((row) => row.opId === opId);
  }

  backUp(): void {
    this.backups = [...this.backups, { data: this.copy(this.data), seq: this.data.log.length }].slice(-2);
  }

  /** Goes back to a backup, under a new epoch. */
  restore(generation: number): boolean {
    const backup = this.backups[generation];
    if (!backup) return false;
    this.data = this.copy(backup.data);
    this.backups = this.backups.slice(0, generation + 1);
    this.epoch += 1;
    this.hidden.clear();
    return true;
  }

  private copy({ log, aside, devices }: Data): Data {
    return { log: [...log], aside: new Map(aside), devices: new Map(devices) };
  }

  private envelope() {
    return { protocol: 1, epoch: this.epoch, serverTime: new Date(this.now()).toISOString() };
  }

  private enrol(user: string, commit: boolean): NetworkAnswer {
    const deviceId = `device-${this.epoch}-${this.data.devices.size}-${this.now().toFixed(3)}`;
    if (commit) this.data.devices.set(deviceId, user);
    return jsonAnswer(200, { deviceId, deviceKey: 'key', epoch: this.epoch, serverTime: this.envelope().serverTime });
  }

  private have(body: string): NetworkAnswer {
    const { opIds }: { opIds: string[] } = JSON.parse(body);
    return jsonAnswer(200, { ...this.envelope(), have: opIds.filter((opId) => this.row(opId)) });
  }

  private pull(cursor: string): NetworkAnswer {
    const [epoch, seq] = cursor.split(':').map(Number);
    if (epoch !== this.epoch) return jsonAnswer(409, { code: 'epoch-mismatch', epoch: this.epoch });
    const visible = this.data.log.filter((row) => row.seq > (seq ?? 0) && !this.hidden.has(row.opId));
    const rows = visible.slice(0, PAGE);
    const next = `${this.epoch}:${rows.at(-1)?.seq ?? seq ?? 0}`;
    return jsonAnswer(200, { ...this.envelope(), safeSeq: this.safeSeq, rows, next, more: visible.length > PAGE });
  }

  private push(body: string, user: string, commit: boolean): NetworkAnswer {
    const { epoch, ops }: { epoch: number; ops: Op[] } = JSON.parse(body);
    if (epoch !== this.epoch) return jsonAnswer(409, { code: 'epoch-mismatch', epoch: this.epoch });
    const stumble = ops.map((op) => STUMBLES[reasonOf(op)]).find((status) => status !== undefined);
    if (stumble !== undefined) return jsonAnswer(stumble, { code: stumble === 500 ? 'internal' : 'shape' });
    const kept = this.copy(this.data);
    const results = new Map<Op, PushResult>();
    for (const op of [...ops].sort((a, b) => a.n - b.n)) results.set(op, this.apply(op, user));
    this.unpark(user);
    if (!commit) this.data = kept;
    const safeSeq = this.safeSeq;
    return jsonAnswer(200, { ...this.envelope(), safeSeq, results: ops.map((op) => results.get(op)) });
  }

  private apply(op: Op, user: string): PushResult {
    const answer = { opId: op.opId, bodyHash: op.bodyHash };
    const known = this.fault === 'no-dedupe' ? undefined : this.row(op.opId);
    if (known?.bodyHash === op.bodyHash) return { ...answer, r: 'duplicate', seq: known.seq };
    if (known) return { ...answer, ...this.setAside(op, 'conflict', 'conflict') };
    if (reasonOf(op) === 'refuse') return { ...answer, r: 'refused', code: 'right' };
    if (reasonOf(op) === 'quarantine') return { ...answer, ...this.setAside(op, 'quarantined', 'value') };
    if (this.misses(op)) return { ...answer, ...this.setAside(op, 'parked', 'deps') };
    this.data.aside.delete(asideKey(op));
    return { ...answer, r: 'applied', seq: this.append(op, user) };
  }

  private append(op: Op, actor: string): number {
    const seq = this.data.log.length + 1;
    const receivedAt = new Date(this.now()).toISOString();
    this.data.log.push({ ...op, seq, actor, receivedAt, flags: [] });
    if (this.fault === 'ack-before-commit') this.mayForget(op.opId);
    if (this.fault === 'cursor-by-start-order' && seq % 3 === 0) {
      this.hidden.add(op.opId);
      this.later(400, () => this.hidden.delete(op.opId));
    }
    return seq;
  }

  /** The answer is out, the commit is not: every seventh row goes with a crash in between. */
  private mayForget(opId: string): void {
    if (this.data.log.length % 7 !== 0) return;
    this.later(20, () => {
      if (this.data.log.at(-1)?.opId === opId) this.data.log.pop();
    });
  }

  private setAside(op: Op, r: PushOutcome, code: string): { r: PushOutcome; code: string } {
    this.data.aside.set(asideKey(op), { op, r, code });
    return { r, code };
  }

  /** Does the operation speak of something that is not here? */
  private misses({ kind, reading, visit, body }: Op): boolean {
    const opened = (what: string, id: string | null) =>
      this.data.log.some((row) => row.kind === `${what}.open` && (what === 'reading' ? row.reading : row.visit) === id);
    if (kind === 'reading.open') return !opened('visit', visit);
    if (kind === 'cell.retract') return !this.row(String(body.target));
    if (kind !== 'cell.mark') return false;
    const replaced = typeof body.supersedes === 'string' ? body.supersedes : null;
    return !opened('reading', reading) || (replaced !== null && !this.row(replaced));
  }

  private unpark(user: string): void {
    for (let moved = true; moved;) {
      moved = false;
      for (const [key, { op, r }] of this.data.aside) {
        if (r !== 'parked' || this.misses(op) || this.row(op.opId)) continue;
        this.data.aside.delete(key);
        this.append(op, user);
        moved = true;
      }
    }
  }
}
