import {
  DeviceDatabase,
  type KnownPerson,
  forgetPerson,
  lastPerson,
  leavePhone,
  noteLeft,
  personKey,
} from './device-database';
import type { DrainEnd } from './drain-ports';
import type { Edges } from './edges';
import { type Opening, openSession } from './open-session';
import { Records } from './records';
import { requeueRefused } from './requeue-refused';
import type { SessionView } from './session-view';
import { signOutAtOffice } from './sign-out';
import { type OwnSignal, type Signal, createSignal } from './signal';

/** What the whole field app stands on: who uses it, and their open records. */
export interface FieldStanding {
  view: SessionView;
  records: Records | null;
  /** How other tabs of this app stand to this one. */
  tab: TabState;
}

/**
 * `blocked`: a tab with an older version still holds the records; they open once it lets go.
 * `taken-over`: a tab with a newer version has them; this one has to be loaded again.
 */
export type TabState = 'alone' | 'blocked' | 'taken-over';

/**
 * The session of one page. It opens the last person's records at once, whatever the network does, and asks the office
 * meanwhile; what the office says can only change who is signed in, never what is kept.
 */
export class FieldSession {
  private readonly device: DeviceDatabase;
  private readonly own: OwnSignal<FieldStanding> = createSignal<FieldStanding>({
    view: { kind: 'loading' },
    records: null,
    tab: 'alone',
  });
  private asking: Promise<void> | null = null;
  /** A deletion on its way: nobody may close the records under it. */
  private deleting: Promise<boolean> | null = null;

  constructor(private readonly edges: Edges) {
    this.device = new DeviceDatabase(edges.dexie);
  }

  /** Who uses the app, and their records. */
  get standing(): Signal<FieldStanding> {
    return this.own;
  }

  /** Opens the app. */
  async start(): Promise<void> {
    const last = await lastPerson(this.device).catch(() => null);
    if (last) await this.openRecords(last);
    await this.refresh();
  }

  /** Asks the office who is signed in. Calls that overlap are one. */
  refresh(): Promise<void> {
    this.asking ??= this.ask().finally(() => {
      this.asking = null;
    });
    return this.asking;
  }

  /** Leaves this phone. Unsent records stay on it, closed, until the same person signs in again. */
  async signOut(): Promise<void> {
    const { view } = this.own.get();
    if (view.kind !== 'ready' && view.kind !== 'needs-sign-in') return;
    await leavePhone(this.device, view.person);
    this.nobody(true);
    if (await signOutAtOffice(this.edges.network)) await noteLeft(this.device);
  }

  /**
   * Leaves this phone and deletes the person's records from it.
   *
   * @param copied ids of the operations that a copy was made of.
   * @returns false when something came after the copy: then the records stay, closed, as after `signOut`.
   */
  async signOutAndDelete(copied: ReadonlySet<string>): Promise<boolean> {
    const { view, records } = this.own.get();
    if (!records || (view.kind !== 'ready' && view.kind !== 'needs-sign-in')) return false;
    // The person is forgotten first: a phone that dies in between has kept everything, closed.
    this.deleting = forgetPerson(this.device, view.person).then(() => records.deleteIfCopied(copied));
    const deleted = await this.deleting.finally(() => {
      this.deleting = null;
      this.nobody(true);
    });
    if (await signOutAtOffice(this.edges.network)) await noteLeft(this.device);
    return deleted;
  }

  /** Somebody has left this phone, or come to it, in another tab: what is shown here may not be theirs. */
  async follow(): Promise<void> {
    await this.asking;
    await this.deleting;
    const last = await lastPerson(this.device);
    const { records, view } = this.own.get();
    const shown = records && personKey(records.person);
    if (view.kind === 'loading' || shown === (last?.key ?? null)) return;
    this.nobody(true);
    if (last) await this.refresh();
  }

  private async ask(): Promise<void> {
    const { network, clock } = this.edges;
    const opening = await openSession({ network, clock, device: this.device });
    if (opening.kind === 'nobody') return this.nobody(opening.reachable);
    const { records, view } = this.own.get();
    const isOpen = records !== null && personKey(records.person) === opening.person.key;
    if (!isOpen || rolesDiffer(view, opening.person)) await this.openRecords(opening.person);
    await this.take(opening);
  }

  private nobody(reachable: boolean): void {
    this.own.get().records?.close();
    this.own.set({ view: { kind: 'signed-out', reachable }, records: null, tab: 'alone' });
  }

  /** Takes in what the office said about the person whose records are open. */
  private async take(opening: Exclude<Opening, { kind: 'nobody' }>): Promise<void> {
    const { view, records } = this.own.get();
    if (view.kind !== 'ready' && view.kind !== 'needs-sign-in') return;
    const { person } = opening;
    if (opening.kind === 'confirmed') {
      const { formerRole } = opening;
      if (records && formerRole !== null && formerRole !== person.role) await requeueRefused(records.store);
      this.show({ ...view, kind: 'ready', person });
      if (view.kind === 'needs-sign-in') records?.wake('signed-in');
    } else if (opening.kind === 'expired') this.show({ ...view, kind: 'needs-sign-in', person });
  }

  private show(view: SessionView): void {
    this.own.set({ ...this.own.get(), view });
  }

  private async openRecords(person: KnownPerson): Promise<void> {
    this.own.get().records?.close();
    const records = new Records(this.edges, person, {
      ended: (end) => this.afterPass(records, end),
      cleared: () => this.change(records, { storageCleared: true }),
      takenOver: () => this.takenOver(records),
      blocked: () => this.own.set({ ...this.own.get(), tab: 'blocked' }),
    });
    const storageCleared = await records.start(this.device, person.sentinel);
    const meta = await records.store.readMeta();
    const enrolled = (meta?.deviceId ?? null) !== null;
    this.own.set({ view: { kind: 'ready', person, enrolled, storageCleared }, records, tab: 'alone' });
  }

  private takenOver(records: Records): void {
    if (this.own.get().records === records) this.own.set({ ...this.own.get(), tab: 'taken-over' });
  }

  /** Changes the view of these records, unless others have been opened since. */
  private change(
    records: Records,
    part: { enrolled?: boolean; storageCleared?: boolean; kind?: 'needs-sign-in' },
  ): void {
    const { view, records: present } = this.own.get();
    if (present !== records || (view.kind !== 'ready' && view.kind !== 'needs-sign-in')) return;
    this.show({ ...view, ...part });
  }

  private afterPass(records: Records, end: DrainEnd): void {
    if (end.kind === 'done') this.change(records, { enrolled: true });
    if (end.kind === 'sign-in') this.change(records, { kind: 'needs-sign-in' });
    // The cookie may have become somebody else's: then their records are opened, and these stay closed and unsent.
    if (end.kind === 'revoked') void this.refresh();
  }
}

/** Has the office given this person another role since their records were opened? */
function rolesDiffer(view: SessionView, person: KnownPerson): boolean {
  return (view.kind === 'ready' || view.kind === 'needs-sign-in') && view.person.role !== person.role;
}
