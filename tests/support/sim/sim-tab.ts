import { createHash } from 'node:crypto';
import { commitOps } from '@/lib/offline/commit-op';
import { createDrain } from '@/lib/offline/drain';
import type { DrainPorts } from '@/lib/offline/drain-ports';
import { officeEpoch } from '@/lib/offline/enrol-device';
import { noWebLock } from '@/lib/offline/lease';
import type { OpDraft } from '@/lib/offline/local-op';
import { type OpMaker, type OpRequest, makeOp } from '@/lib/offline/make-op';
import { NotSavedError } from '@/lib/offline/not-saved';
import { type Schedule, startSchedule } from '@/lib/offline/schedule';
import { type Store, newMeta } from '@/lib/offline/store';
import { watchStore } from '@/lib/offline/watch-store';
import type { MemoryDisk } from './memory-disk';
import { memoryStore } from './memory-store';
import type { ModelServer } from './model-server';
import type { SimClock } from './sim-clock';
import { simConnection } from './sim-disk';
import { simNetwork } from './sim-network';
import type { Weather } from './weather';
import type { Process, World } from './world';

/** What all tabs of a run share. */
export interface Surroundings {
  world: World;
  server: ModelServer;
  weather: () => Weather;
  /** Told about everything that was entered. */
  made(draft: OpDraft): void;
  /** Told when a person saw "saved here". */
  saved(draft: OpDraft, tab: SimTab): void;
  sent(): void;
  /** Makes operation ids; a broken one counts instead of drawing. */
  newId(tab: SimTab): string;
}

function sha256(text: string): Promise<string> {
  return Promise.resolve(createHash('sha256').update(text, 'utf8').digest('hex'));
}

/** One open tab of the field app on one phone: the real core over a simulated disk and network. */
export class SimTab implements Process {
  alive = true;
  frozenUntil = 0;
  readonly disk: MemoryDisk;
  readonly user: string;
  readonly store: Store;
  private readonly ports: DrainPorts;
  private readonly maker: OpMaker;
  private schedule: Schedule | null = null;

  constructor(
    private readonly around: Surroundings,
    { disk, user, clock }: { disk: MemoryDisk; user: string; clock: SimClock },
  ) {
    this.disk = disk;
    this.user = user;
    const { world, server, weather, sent } = around;
    const connection = simConnection(world, this, weather);
    const timers = { after: (ms: number, fire: () => void) => world.after(this, ms, fire) };
    const raw = { ...memoryStore(disk, connection.run), reopen: connection.reopen };
    this.store = watchStore(raw, timers);
    const network = simNetwork({ world, weather, server, process: this, user, sent });
    const base = {
      store: this.store,
      clock,
      timers,
      network,
      lock: noWebLock,
      holder: world.id(),
      label: 'phone',
      enrols: true,
    };
    this.ports = { ...base, report: () => undefined, keepDevice: () => world.wait(this, 5) };
    this.maker = { clock, newId: () => around.newId(this), sha256, skewMs: () => disk.meta?.skewMs ?? null };
  }

  /** Opens the records, or founds them, and starts sending. */
  async start(): Promise<void> {
    const { world } = this.around;
    const drain = createDrain(this.ports);
    this.schedule = startSchedule({
      drain,
      timers: this.ports.timers,
      random: world.random,
      isWaiting: async () => (await this.store.counts()).queued > 0,
      probe: async () => (await officeEpoch(this.ports)) !== null,
      ended: (end) => {
        if (end.kind === 'cleared') void this.found();
      },
    });
    await this.found();
  }

  /** The person does something. Nothing counts as saved before its transaction has completed. */
  async record(request: OpRequest): Promise<void> {
    const draft = await makeOp(this.maker, request);
    this.around.made(draft);
    try {
      await commitOps(this.ports, { drafts: [draft] });
      this.around.saved(draft, this);
    } catch (error) {
      if (!(error instanceof NotSavedError)) throw error;
      if (error.reason === 'cleared') await this.found();
    }
  }

  signedIn(): void {
    this.schedule?.wake('signed-in');
  }

  online(): void {
    this.schedule?.wake('online');
  }

  kill(): void {
    this.alive = false;
  }

  private async found(): Promise<void> {
    await this.store.found(newMeta(this.around.world.id(), this.user)).catch(() => undefined);
  }
}
