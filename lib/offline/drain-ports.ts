import type { Verdict } from './classify-answer';
import type { LeasePorts } from './lease';
import type { Network } from './network';
import type { Trouble } from './trouble';

/** How far a push has come: the request on its way ends with operation `k` of `n`. */
export interface Progress {
  k: number;
  n: number;
}

/** Everything the drain touches. */
export interface DrainPorts extends LeasePorts {
  network: Network;
  /** The name the office shows for this phone. */
  label: string;
  /** May this person's role enrol a phone? Others only read. */
  enrols: boolean;
  /** Called while a push is on its way, and with null when none is. */
  report(progress: Progress | null): void;
  /** Called after an enrolment, before anything is sent as that device. */
  keepDevice(device: { deviceId: string; deviceKey: string }): Promise<void>;
}

/** How a pass of the drain ended. */
export type DrainEnd =
  /** The queue is empty and every row of the office is here. */
  | { kind: 'done' }
  | { kind: 'again'; trouble: Trouble; afterMs: number | null }
  /** Another tab is at it. */
  | { kind: 'elsewhere' }
  | { kind: 'sign-in' }
  | { kind: 'revoked' }
  | { kind: 'role' }
  | { kind: 'update' }
  /** The browser has emptied our storage. */
  | { kind: 'cleared' };

/** How a step of a pass ended: null goes on with the next step, `epoch` starts the pass anew. */
export type StepEnd = DrainEnd | { kind: 'epoch'; from: number; epoch: number | null } | null;

/** What every step does with a verdict that is not about its own batch. */
export function endOf(verdict: Exclude<Verdict<unknown>, { kind: 'ok' }>, epoch: number): StepEnd {
  switch (verdict.kind) {
    case 'again':
      return { kind: 'again', trouble: verdict.trouble, afterMs: verdict.afterMs };
    case 'server-error':
    case 'bad-batch':
    case 'restart':
      return { kind: 'again', trouble: 'office-busy', afterMs: null };
    case 'epoch':
      return { kind: 'epoch', from: epoch, epoch: verdict.epoch };
    default:
      return verdict;
  }
}
