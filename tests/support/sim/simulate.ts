import { createHash } from 'node:crypto';
import type { OpDraft } from '@/lib/offline/local-op';
import { type Violation, checkEnd, checkPhone } from './check-invariants';
import { MemoryDisk } from './memory-disk';
import { ModelServer, type ServerFault } from './model-server';
import { nextDeed } from './person';
import { SimClock } from './sim-clock';
import type { RunFacts, SavedOp, SimPhone } from './run-facts';
import { SimTab } from './sim-tab';
import { CALM, type Weather, roughWeather } from './weather';
import { World } from './world';

/** What a run may be told beyond its seed. */
export interface SimOptions {
  /** Changes the weather that the seed draws. */
  weather?: Partial<Weather>;
  /** Builds the office wrongly. */
  serverFault?: ServerFault;
  /** Draws operation ids from the device and a counter, as one must not. */
  countedIds?: boolean;
  /** Every phone has two tabs. */
  twoTabs?: boolean;
}

/** What a run did and what it found. */
export interface SimReport {
  seed: number;
  saved: number;
  requests: number;
  restores: number;
  crashes: number;
  violations: Violation[];
}

/** How long it storms, how long the queue may take afterwards (I12), and how long until everyone has everything. */
const STORM_MS = 120_000;
const DRAIN_MS = 60_000;
const NEWS_MS = 20_000;

/** One run of the world with several phones and one office. */
class Run implements RunFacts {
  readonly world: World;
  readonly server: ModelServer;
  readonly phones: SimPhone[] = [];
  readonly saved = new Map<string, SavedOp>();
  readonly made = new Set<string>();
  readonly exempt = new Set<string>();
  readonly violations: Violation[] = [];
  weather: Weather;
  requests = 0;
  restores = 0;
  crashes = 0;

  constructor(
    readonly seed: number,
    private readonly options: SimOptions,
  ) {
    this.world = new World(seed);
    const { world } = this;
    this.weather = { ...roughWeather(world), ...options.weather };
    const now = () => new SimClock(world, '').now();
    this.server = new ModelServer(now, (ms, fire) => world.later(ms, fire), options.serverFault);
  }

  async play(): Promise<SimReport> {
    for (const user of ['user-a', 'user-b', 'user-c']) this.addPhone(user, new MemoryDisk());
    this.storm();
    await this.world.runUntil(STORM_MS);
    this.heal();
    await this.world.runUntil(STORM_MS + DRAIN_MS);
    for (const { disk } of this.phones) this.mustBeEmpty(disk);
    for (const { tabs } of this.phones) for (const tab of tabs) tab.online();
    await this.world.runUntil(STORM_MS + DRAIN_MS + NEWS_MS);
    this.violations.push(...checkEnd(this));
    const { seed, requests, restores, crashes, violations } = this;
    return { seed, saved: this.saved.size, requests, restores, crashes, violations };
  }

  private addPhone(user: string, disk: MemoryDisk): SimPhone {
    const clock = new SimClock(this.world, this.world.id());
    const phone: SimPhone = { disk, clock, user, tabs: [], wiped: false };
    this.phones.push(phone);
    this.openTab(phone);
    if (this.world.chance(0.4) || this.options.twoTabs) this.openTab(phone);
    return phone;
  }

  private openTab(phone: SimPhone): void {
    const { world, server } = this;
    const around = {
      world,
      server,
      weather: () => this.weather,
      made: ({ opId, bodyHash }: OpDraft) => void this.made.add(`${opId} ${bodyHash}`),
      saved: (draft: OpDraft, tab: SimTab) => this.noteSaved(draft, tab.disk),
      sent: () => (this.requests += 1),
      newId: (tab: SimTab) => this.newId(tab),
    };
    const tab = new SimTab(around, phone);
    phone.tabs.push(tab);
    void tab.start();
    this.deeds(phone, tab);
  }

  private newId(tab: SimTab): string {
    const { meta } = tab.disk;
    if (!this.options.countedIds || !meta?.deviceId) return this.world.id();
    const device = createHash('sha256').update(meta.deviceId).digest('hex');
    return `${device.slice(0, 8)}-${device.slice(8, 12)}-7000-8000-${String(meta.n + 1).padStart(12, '0')}`;
  }

  private noteSaved({ opId, bodyHash }: OpDraft, disk: MemoryDisk): void {
    const key = `${opId} ${bodyHash}`;
    this.saved.set(key, { opId, bodyHash, disk });
    // Written, emptied by the browser, and only then confirmed.
    const wiped = this.phones.some((phone) => phone.disk === disk && phone.wiped);
    if (wiped && !disk.ops.has(opId) && !this.server.holds(opId, bodyHash)) this.exempt.add(key);
  }

  /** The person at this tab goes on recording until the storm is over. */
  private deeds(phone: SimPhone, tab: SimTab): void {
    const { world } = this;
    world.later(world.between(500, 9_000), () => {
      if (!tab.alive || world.time > STORM_MS - 2_000) return;
      if (phone.disk.meta && world.time >= tab.frozenUntil)
        void tab.record(nextDeed(world, phone.disk, this.weather.poison));
      this.deeds(phone, tab);
    });
  }

  /** Lets something happen again and again while it storms. */
  private every(meanMs: number, happen: () => void): void {
    const { world } = this;
    if (meanMs === Infinity) return;
    const again = () =>
      world.later(world.between(0, 2 * meanMs), () => {
        if (world.time >= STORM_MS) return;
        happen();
        again();
      });
    again();
  }

  private storm(): void {
    const { world, weather, server } = this;
    const anyPhone = () => world.pick(this.phones);
    this.every(weather.crashEveryMs, () => this.crash(anyPhone()));
    this.every(weather.freezeEveryMs, () => this.freeze(anyPhone()));
    this.every(weather.backupEveryMs, () => server.backUp());
    this.every(weather.restoreEveryMs, () => this.restore());
    this.every(weather.clockJumpEveryMs, () => this.jumpClock(anyPhone()));
    this.every(weather.signOutEveryMs, () => this.signOut(anyPhone()));
    if (weather.wipe > 0) world.later(world.between(20_000, STORM_MS), () => this.wipe(anyPhone()));
    if (weather.clone > 0) world.later(world.between(20_000, STORM_MS - 20_000), () => this.clone(anyPhone()));
  }

  private crash(phone: SimPhone): void {
    const { world } = this;
    this.crashes += 1;
    const [tab] = phone.tabs.splice(world.below(phone.tabs.length), 1);
    tab?.kill();
    this.violations.push(...checkPhone(this, phone));
    world.later(Math.min(world.between(10, 5_000), STORM_MS - world.time), () => this.openTab(phone));
  }

  private freeze(phone: SimPhone): void {
    const [tab] = phone.tabs;
    const until = this.world.time + this.world.between(1_000, 45_000);
    if (tab) tab.frozenUntil = Math.min(until, STORM_MS);
  }

  private restore(): void {
    const { server, world } = this;
    if (!server.restore(world.below(server.backups.length || 1))) return;
    this.restores += 1;
    for (const [key, { opId, bodyHash, disk }] of this.saved) {
      const wiped = this.phones.some((phone) => phone.disk === disk && phone.wiped);
      const kept = disk.ops.get(opId);
      const gone = !kept || kept.state === 'remote';
      if (wiped && gone && !server.holds(opId, bodyHash)) this.exempt.add(key);
    }
  }

  private jumpClock({ clock }: SimPhone): void {
    const { world } = this;
    const day = 86_400_000;
    clock.aheadMs += world.pick([-400 * day, 400 * day, -3_600_000, 3_600_000, 60_000, -60_000, -clock.aheadMs]);
  }

  private signOut({ user }: SimPhone): void {
    const { server, world } = this;
    server.signedOut.add(user);
    world.later(world.between(2_000, 30_000), () => this.signIn(user));
  }

  private signIn(user: string): void {
    this.server.signedOut.delete(user);
    for (const phone of this.phones) if (phone.user === user) for (const tab of phone.tabs) tab.signedIn();
  }

  /** The browser empties a phone: what the office does not hold by then is gone, and nobody could help that. */
  private wipe(phone: SimPhone): void {
    phone.wiped = true;
    for (const [key, { opId, bodyHash, disk }] of this.saved) {
      if (disk === phone.disk && !this.server.holds(opId, bodyHash)) this.exempt.add(key);
    }
    phone.disk.clear();
  }

  private clone(phone: SimPhone): void {
    if (phone.disk.meta) this.addPhone(phone.user, phone.disk.clone());
  }

  /** The storm is over: the network carries, everyone is signed in, every phone has an open tab. */
  private heal(): void {
    this.weather = CALM;
    for (const { user } of this.phones) this.server.signedOut.delete(user);
    for (const phone of this.phones) {
      if (phone.tabs.length === 0) this.openTab(phone);
      for (const tab of phone.tabs) tab.online();
    }
  }

  private mustBeEmpty(disk: MemoryDisk): void {
    const left = [...disk.ops.values()].filter((row) => row.state === 'queued');
    for (const row of left)
      this.violations.push({ invariant: 'I12', what: `still queued after heal: ${row.kind} ${row.key}` });
  }
}

/**
 * Plays one seed: phones record through a storm, the storm ends, and everything must come out right. Equal seeds and
 * options give equal runs.
 */
export function simulate(seed: number, options: SimOptions = {}): Promise<SimReport> {
  return new Run(seed, options).play();
}
