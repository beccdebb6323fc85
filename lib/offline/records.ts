import type { Op } from '@/lib/protocol/op';
import { type Commands, createCommands } from './commands';
import { type CommitEntry, commitOps } from './commit-op';
import { checkConnection } from './connection-health';
import { type DeviceDatabase, noteOfPerson } from './device-database';
import { RecordsDatabase, recordsName } from './dexie-database';
import { dexieStore, emptyIfCopied } from './dexie-store';
import { createDrain } from './drain';
import type { DrainEnd, DrainPorts, Progress } from './drain-ports';
import { officeEpoch } from './enrol-device';
import type { Edges } from './edges';
import { loadRecorder } from './load-recorder';
import type { OpMaker, OpenDraft } from './make-op';
import { NotSavedError } from './not-saved';
import { CombRecorder } from './recorder';
import { type Schedule, type WakeReason, startSchedule } from './schedule';
import type { Person } from './session-view';
import { type OwnSignal, type Signal, createSignal } from './signal';
import { type Store, newMeta } from './store';
import { watchStore } from './watch-store';

/** What is known in memory only: how the drain is doing, and what is not saved. */
export interface Activity {
  progress: Progress | null;
  lastEnd: DrainEnd | null;
  notSaved: number;
}

/** Who hears what happens to the records. */
export interface RecordsListener {
  /** How a pass of the drain ended. */
  ended(end: DrainEnd): void;
  /** The browser has emptied the records while they were open. */
  cleared(): void;
  /** Another tab has taken the database over; nothing more is kept from this page. */
  takenOver(): void;
  /** A tab with an older version still holds the database. */
  blocked(): void;
}

/** Roles whose phones may be enrolled. */
const ENROLS: ReadonlySet<Person['role']> = new Set(['technician', 'reviewer', 'biologist']);

/** The open records of one person: their storage, their drain, and the recorders on the screen. */
export class Records {
  readonly db: RecordsDatabase;
  readonly store: Store;
  readonly commands: Commands;
  readonly activity: Signal<Activity>;
  private readonly ownActivity: OwnSignal<Activity>;
  private readonly maker: OpMaker;
  private readonly recorders = new Map<string, Promise<CombRecorder | null>>();
  private readonly open = new Map<string, CombRecorder>();
  private schedule: Schedule | null = null;
  private skewMs: number | null = null;

  constructor(
    private readonly edges: Edges,
    readonly person: Person,
    private readonly told: RecordsListener,
  ) {
    const { clock, newId, sha256, timers } = edges;
    this.db = new RecordsDatabase(recordsName(person.teamId, person.userId), edges.dexie);
    this.db.listen(told);
    this.store = watchStore(dexieStore(this.db), timers);
    this.maker = { clock, newId, sha256, skewMs: () => this.skewMs };
    this.commands = createCommands({ maker: this.maker, commit: this.commit });
    this.ownActivity = createSignal<Activity>({ progress: null, lastEnd: null, notSaved: 0 });
    this.activity = this.ownActivity;
  }

  /**
   * Opens the storage and starts sending.
   *
   * @param sentinel the sentinel noted for this person, null when there is none yet.
   * @returns true when the browser has emptied the records since they were last open.
   */
  async start(device: DeviceDatabase, sentinel: string | null): Promise<boolean> {
    // Waits for a tab with an older version as long as that takes; what follows has no patience.
    await this.db.open();
    const meta = await this.found();
    await noteOfPerson(device, this.person, { sentinel: meta.sentinel });
    this.schedule = startSchedule({
      drain: createDrain(this.drainPorts(device)),
      timers: this.edges.timers,
      random: this.edges.random,
      isWaiting: async () => (await this.store.counts()).queued > 0,
      probe: async () => (await officeEpoch(this.edges)) !== null,
      ended: (end) => void this.afterPass(end),
    });
    return sentinel !== null && sentinel !== meta.sentinel;
  }

  /** Saves operations; rejects with `NotSavedError`, and then the caller keeps them. */
  commit = async (entry: CommitEntry): Promise<Op[]> => {
    const { clock, timers } = this.edges;
    try {
      return await commitOps({ store: this.store, clock, timers }, entry);
    } catch (error) {
      if (error instanceof NotSavedError && error.reason === 'cleared') await this.afterClearing();
      throw error;
    }
  };

  /** The recorder of a reading, the same one for every caller; null when the reading is not on this phone. */
  recorder(reading: string): Promise<CombRecorder | null> {
    const known = this.recorders.get(reading);
    if (known) return known;
    const loading = this.loadRecorder(reading);
    this.recorders.set(reading, loading);
    // A failure is not kept: the next caller asks the storage again.
    loading.catch(() => this.recorders.delete(reading));
    return loading;
  }

  /** Lets go of a recorder that has nothing unsaved. */
  closeRecorder(reading: string): void {
    if ((this.open.get(reading)?.unsaved().length ?? 0) > 0) return;
    this.recorders.delete(reading);
    this.open.delete(reading);
  }

  /** What the recorders could not save. */
  notSaved(): OpenDraft[] {
    return [...this.open.values()].flatMap((recorder) => recorder.unsaved());
  }

  /** After the app was in the background: repairs the connection, takes in what other tabs did, and sends. */
  async resume(): Promise<void> {
    await checkConnection({ store: this.store, timers: this.edges.timers });
    for (const [reading, recorder] of this.open) {
      recorder.retryUnsaved();
      const fresh = await loadRecorder(this.store, this.person.userId, reading);
      if (fresh) recorder.reload(fresh);
    }
    this.wake('visible');
  }

  /** Starts a pass now. */
  wake(reason: WakeReason): void {
    this.schedule?.wake(reason);
  }

  /**
   * Deletes these records from the phone when every operation still needed is in a copy, and closes them either way.
   *
   * @returns false when the copy lacked one: then everything is still there.
   */
  async deleteIfCopied(copied: ReadonlySet<string>): Promise<boolean> {
    this.schedule?.stop();
    const emptied = await emptyIfCopied(this.db, copied);
    this.db.close();
    if (emptied) await this.db.delete();
    return emptied;
  }

  /** Stops sending and closes the storage. Nothing is deleted. */
  close(): void {
    this.schedule?.stop();
    this.db.close();
  }

  private found() {
    return this.store.found(newMeta(this.edges.newId(), this.person.userId));
  }

  private drainPorts(device: DeviceDatabase): DrainPorts {
    const { clock, timers, network, page, webLock, label } = this.edges;
    return {
      store: this.store,
      clock,
      timers,
      network,
      label,
      holder: page,
      lock: webLock(this.db.name),
      enrols: ENROLS.has(this.person.role),
      report: (progress) => this.note({ progress }),
      keepDevice: (keys) => noteOfPerson(device, this.person, keys),
    };
  }

  private async afterPass(end: DrainEnd): Promise<void> {
    this.note({ lastEnd: end, progress: null });
    this.told.ended(end);
    const meta = await this.store.readMeta().catch(() => null);
    this.skewMs = meta?.skewMs ?? this.skewMs;
    if (end.kind === 'cleared') await this.afterClearing();
    if (end.kind === 'again') await this.edges.askForWake().catch(() => undefined);
  }

  /** The browser has emptied the records: starts new ones, so that what comes next is kept. */
  private async afterClearing(): Promise<void> {
    this.told.cleared();
    await this.found().catch(() => undefined);
  }

  private async loadRecorder(reading: string): Promise<CombRecorder | null> {
    const state = await loadRecorder(this.store, this.person.userId, reading);
    if (!state) return null;
    const recorder = new CombRecorder({ maker: this.maker, commit: this.commit }, state);
    recorder.view.subscribe(() => this.countNotSaved());
    this.open.set(reading, recorder);
    return recorder;
  }

  private countNotSaved(): void {
    const views = [...this.open.values()].map((recorder) => recorder.view.get());
    this.note({ notSaved: views.reduce((sum, view) => sum + view.unsaved.length, 0) });
  }

  private note(part: Partial<Activity>): void {
    const before = this.ownActivity.get();
    const after = { ...before, ...part };
    const same =
      after.progress === before.progress && after.lastEnd === before.lastEnd && after.notSaved === before.notSaved;
    if (!same) this.ownActivity.set(after);
  }
}
