import { type Random, seededRandom } from '@/lib/kit/random';

interface Happening {
  at: number;
  order: number;
  /** Returns false when nothing came of it, so that nobody needs to be waited for. */
  fire(): boolean;
}

/** Something that runs and can be killed: a tab of the app. Its waits never end after its death. */
export interface Process {
  alive: boolean;
  /** A frozen tab's waits end at this time at the earliest. */
  frozenUntil: number;
}

/** Lets every promise that can go on without time passing do so. */
function settle(): Promise<void> {
  return new Promise((resolve) => setImmediate(resolve));
}

function before(a: Happening, b: Happening): boolean {
  return a.at < b.at || (a.at === b.at && a.order < b.order);
}

/** One deterministic world: its time, its chance, and everything that is going to happen in it. */
export class World {
  time = 0;
  readonly random: Random;
  private heap: Happening[] = [];
  private order = 0;

  constructor(readonly seed: number) {
    this.random = seededRandom(seed);
  }

  /** True with probability `p`. */
  chance(p: number): boolean {
    return this.random() < p;
  }

  /** A number in [low, high). */
  between(low: number, high: number): number {
    return low + this.random() * (high - low);
  }

  /** A whole number in [0, n). */
  below(n: number): number {
    return Math.floor(this.random() * n);
  }

  pick<T>(items: readonly T[]): T {
    const item = items[this.below(items.length)];
    if (item === undefined) throw new RangeError('nothing to pick from');
    return item;
  }

  /** 128 bits of the world's chance as UUID text. */
  id(): string {
    let hex = '';
    while (hex.length < 32) hex += this.below(65_536).toString(16).padStart(4, '0');
    return [hex.slice(0, 8), hex.slice(8, 12), `7${hex.slice(13, 16)}`, `8${hex.slice(17, 20)}`, hex.slice(20)].join(
      '-',
    );
  }

  /** Makes something happen after `ms`. */
  later(ms: number, fire: () => void): void {
    this.schedule(ms, () => {
      fire();
      return true;
    });
  }

  /** A process's timer: it never fires after the process's death, and fires late when it is frozen. */
  after(process: Process, ms: number, fire: () => void): () => void {
    let cancelled = false;
    const end = () => {
      if (!process.alive || cancelled) return false;
      const late = process.frozenUntil - this.time;
      if (late > 0) this.schedule(late, end);
      else fire();
      return late <= 0;
    };
    this.schedule(ms, end);
    return () => {
      cancelled = true;
    };
  }

  /** A wait of a process. */
  wait(process: Process, ms: number): Promise<void> {
    return new Promise((resolve) => this.after(process, ms, resolve));
  }

  /** Lets time pass until `time`. */
  async runUntil(time: number): Promise<void> {
    await settle();
    for (let next = this.heap[0]; next && next.at <= time; next = this.heap[0]) {
      this.pop();
      this.time = next.at;
      if (next.fire()) await settle();
    }
    this.time = time;
  }

  private schedule(ms: number, fire: () => boolean): void {
    this.push({ at: this.time + Math.max(0, ms), order: this.order++, fire });
  }

  private push(item: Happening): void {
    const { heap } = this;
    heap.push(item);
    let i = heap.length - 1;
    for (;;) {
      const parent = (i - 1) >> 1;
      const above = heap[parent];
      if (i === 0 || !above || before(above, item)) break;
      heap[i] = above;
      i = parent;
    }
    heap[i] = item;
  }

  private pop(): void {
    const { heap } = this;
    const last = heap.pop();
    if (!last || heap.length === 0) return;
    let i = 0;
    for (;;) {
      const left = heap[2 * i + 1];
      const right = heap[2 * i + 2];
      if (!left) break;
      const [child, at] = right && before(right, left) ? [right, 2 * i + 2] : [left, 2 * i + 1];
      if (before(last, child)) break;
      heap[i] = child;
      i = at;
    }
    heap[i] = last;
  }
}
