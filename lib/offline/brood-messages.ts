import type { BroodEstimate } from '@/lib/brood/answer';
import type { BroodInput } from '@/lib/brood/input';

/** Goes up when the messages change, so that a page and a worker of different versions notice. */
export const BROOD_PROTOCOL = 1;

/** What can be sent to a worker: a function can not. */
export type BroodTask = Omit<BroodInput, 'digest'>;

/** A question to the worker. */
export interface BroodQuestion {
  protocol: number;
  /** Names the question; the reply bears it too. */
  ticket: number;
  task: BroodTask;
}

/** The worker's reply. `protocol`: it speaks another version; `model`: the estimate could not be made. */
export type BroodReply =
  | { protocol: number; ticket: number; kind: 'answer'; estimate: BroodEstimate }
  | { protocol: number; ticket: number; kind: 'failed'; code: 'protocol' | 'model' };

function isTicketed(value: unknown): value is { protocol: number; ticket: number } {
  if (typeof value !== 'object' || value === null || !('protocol' in value) || !('ticket' in value)) return false;
  return typeof value.protocol === 'number' && typeof value.ticket === 'number';
}

/** Is this a question, of whatever version? */
export function isBroodQuestion(value: unknown): value is BroodQuestion {
  return isTicketed(value) && 'task' in value && typeof value.task === 'object';
}

/** Is this a reply of this version? */
export function isBroodReply(value: unknown): value is BroodReply {
  return (
    isTicketed(value) &&
    value.protocol === BROOD_PROTOCOL &&
    'kind' in value &&
    (value.kind === 'answer' || value.kind === 'failed')
  );
}
