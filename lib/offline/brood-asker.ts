import type { BroodEstimate } from '@/lib/brood/answer';
import { BROOD_PROTOCOL, type BroodQuestion, type BroodTask, isBroodReply } from './brood-messages';
import type { Timers } from './timers';

/**
 * Why there is no estimate on this phone: `no-worker`, its browser can't run one or the file did not load; `protocol`,
 * page and worker are of different versions; `model`, these readings could not be computed with; `timeout`.
 */
export type NoEstimateReason = 'no-worker' | 'protocol' | 'model' | 'timeout';

/** Thrown when the phone cannot estimate. The readings are not touched by that. */
export class NoEstimateError extends Error {
  override name = 'NoEstimateError';
  constructor(readonly reason: NoEstimateReason) {
    super(`no estimate on this phone: ${reason}`);
  }
}

/** A running worker. */
export interface BroodWorker {
  post(question: BroodQuestion): void;
  stop(): void;
}

/** Who hears a worker. */
export interface WorkerListener {
  /** It has said something. */
  said(message: unknown): void;
  /** It could not be loaded, or has fallen over. */
  broken(): void;
}

/** What an asker works with. `makeWorker` may throw where there are no workers. */
export interface BroodAskerPorts {
  makeWorker(listener: WorkerListener): BroodWorker;
  timers: Timers;
}

interface Waiting {
  settle(estimate: BroodEstimate): void;
  fail(reason: NoEstimateReason): void;
  stopClock(): void;
}

/** The longest a phone may think about a nest, in milliseconds. */
const LONGEST_MS = 60_000;

/**
 * Asks for estimates off the main thread. The worker is made with the first question and let go with the last answer,
 * so that a phone does not keep its memory for nothing.
 */
export class BroodAsker {
  private worker: BroodWorker | null = null;
  private tickets = 0;
  private readonly waiting = new Map<number, Waiting>();

  constructor(private readonly ports: BroodAskerPorts) {}

  /**
   * Asks for an estimate.
   *
   * @throws NoEstimateError (as a rejection), with the reason.
   */
  ask = (task: BroodTask): Promise<BroodEstimate> => {
    const ticket = ++this.tickets;
    const answer = new Promise<BroodEstimate>((resolve, reject) => {
      const fail = (reason: NoEstimateReason) => reject(new NoEstimateError(reason));
      const stopClock = this.ports.timers.after(LONGEST_MS, () => this.giveUp('timeout'));
      this.waiting.set(ticket, { settle: resolve, fail, stopClock });
    });
    try {
      this.worker ??= this.ports.makeWorker({
        said: (message) => this.hear(message),
        broken: () => this.giveUp('no-worker'),
      });
      this.worker.post({ protocol: BROOD_PROTOCOL, ticket, task });
    } catch {
      this.giveUp('no-worker');
    }
    return answer;
  };

  private hear(data: unknown): void {
    if (!isBroodReply(data)) return this.giveUp('protocol');
    const waiting = this.waiting.get(data.ticket);
    if (!waiting) return;
    this.waiting.delete(data.ticket);
    waiting.stopClock();
    if (data.kind === 'answer') waiting.settle(data.estimate);
    else waiting.fail(data.code);
    if (this.waiting.size === 0) this.letGo();
  }

  private giveUp(reason: NoEstimateReason): void {
    const all = [...this.waiting.values()];
    this.waiting.clear();
    this.letGo();
    for (const { fail, stopClock } of all) {
      stopClock();
      fail(reason);
    }
  }

  private letGo(): void {
    this.worker?.stop();
    this.worker = null;
  }
}
