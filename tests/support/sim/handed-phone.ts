import { type Random, seededRandom } from '@/lib/kit/random';
import type { Edges } from '@/lib/offline/edges';
import { FieldSession } from '@/lib/offline/field-session';
import { noWebLock } from '@/lib/offline/lease';
import type { NetworkAnswer, NetworkRequest } from '@/lib/offline/network';
import type { Op } from '@/lib/protocol/op';
import { freshIndexedDb } from './fresh-database';
import { countingMaker, sha256 } from './local-ops';
import { ManualTimers } from './manual-timers';
import { NO_ANSWER, ScriptedNetwork, jsonAnswer, problemAnswer } from './scripted-network';

const TIME = '2026-06-16T09:41:00.000Z';

/** What the office has taken, and from whom. */
export interface Taken {
  opId: string;
  /** Whose cookie came with it. */
  from: string;
}

/** An office that knows people by their cookie and keeps what they push, each operation once. */
class SmallOffice {
  /** Whose cookie the phone carries; null when their session has run out or was ended. */
  cookie: string | null = null;
  online = true;
  /** False: the office answers everything but a push. */
  takesPushes = true;
  readonly taken = new Map<string, Taken & { hash: string }>();
  /** Operations that came with another hash than before. */
  readonly contradicted: string[] = [];

  answer(request: NetworkRequest): NetworkAnswer {
    if (!this.online) return NO_ANSWER;
    if (request.path === '/api/health') return jsonAnswer(200, { ok: true, epoch: 1 });
    if (request.path === '/api/auth/csrf') return jsonAnswer(200, { csrfToken: 'token' });
    if (request.path === '/api/auth/signout') return this.end();
    if (this.cookie === null) return problemAnswer(401, 'signin');
    if (request.path === '/api/me') return jsonAnswer(200, this.me(this.cookie));
    if (request.path.endsWith('/enrol'))
      return jsonAnswer(200, { deviceId: `device-of-${this.cookie}`, deviceKey: 'k', epoch: 1, serverTime: TIME });
    if (request.deviceId !== `device-of-${this.cookie}`) return problemAnswer(403, 'device-revoked');
    return this.sync(request, this.cookie);
  }

  private end(): NetworkAnswer {
    this.cookie = null;
    return jsonAnswer(200, { url: '/sign-in' });
  }

  private me(user: string): object {
    const person = { id: user, name: `Name of ${user}` };
    const team = { id: 'team', name: 'Quillard Field Room', zone: 'America/New_York' };
    return { user: person, team, role: 'technician', members: [person], serverTime: TIME };
  }

  private sync(request: NetworkRequest, from: string): NetworkAnswer {
    const ours = { protocol: 1, epoch: 1, serverTime: TIME, safeSeq: 0 };
    if (request.path.includes('/pull')) return jsonAnswer(200, { ...ours, rows: [], next: '1:0', more: false });
    if (!this.takesPushes) return problemAnswer(503, 'busy');
    const { ops }: { ops: Op[] } = JSON.parse(request.body ?? '{}');
    return jsonAnswer(200, { ...ours, results: ops.map((op) => this.take(op, from)) });
  }

  private take({ opId, bodyHash }: Op, from: string): object {
    const known = this.taken.get(opId);
    if (known && known.hash !== bodyHash) this.contradicted.push(opId);
    if (!known) this.taken.set(opId, { opId, from, hash: bodyHash });
    const seq = [...this.taken.keys()].indexOf(opId) + 1;
    return { opId, bodyHash, r: known ? 'duplicate' : 'applied', seq };
  }
}

/** A phone that goes from hand to hand: its storage stays, its pages come and go. */
export class HandedPhone {
  readonly office = new SmallOffice();
  readonly clock = new ManualTimers();
  readonly random: Random;
  session: FieldSession | null = null;
  readonly edges: Edges;
  /** The phone's IndexedDB. */
  readonly idb: IDBFactory;

  constructor(seed: number) {
    this.random = seededRandom(seed);
    const { newId } = countingMaker(this.clock);
    const dexie = freshIndexedDb();
    this.idb = dexie.indexedDB;
    this.edges = {
      clock: this.clock,
      timers: this.clock,
      random: this.random,
      network: new ScriptedNetwork((request) => this.office.answer(request)),
      sha256,
      newId,
      webLock: () => noWebLock,
      askForWake: async () => undefined,
      dexie,
      page: 'page',
      label: 'Android',
    };
  }

  /** Opens the app in a fresh page; the page before is gone without a word, as after a kill. */
  async open(): Promise<FieldSession> {
    this.session?.standing.get().records?.close();
    this.session = new FieldSession(this.edges);
    await this.session.start();
    return this.session;
  }

  /** The open records; fails when there are none. */
  records() {
    const records = this.session?.standing.get().records;
    if (!records) throw new Error('no records are open');
    return records;
  }

  /** Who the app shows, whether or not they have to sign in; null for nobody. */
  shown(): string | null {
    const view = this.session?.standing.get().view;
    return view && 'person' in view ? view.person.userId : null;
  }
}
