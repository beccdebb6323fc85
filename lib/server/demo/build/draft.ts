import 'server-only';
import type { Json } from '@/lib/protocol/canonical-json';
import type { OpKind } from '@/lib/protocol/op';
import type { Person } from '@/lib/server/demo/story/person';
import { demoId, demoSeed } from './demo-id';

/** An operation before its device has numbered, timed and hashed it. */
export interface Draft {
  opId: string;
  by: Person;
  /** When it was recorded, epoch milliseconds. */
  atMs: number;
  /** When it reached the office, epoch milliseconds. */
  sentMs: number;
  kind: OpKind;
  nest: string;
  visit: string | null;
  reading: string | null;
  deps: string[];
  body: { [key: string]: Json };
}

/** Phones with a signal send on the half hour, anything older than ten minutes. */
const SEND_EVERY_MS = 30 * 60_000;
const SEND_AFTER_MS = 10 * 60_000;

/**
 * When something recorded at `atMs` reaches the office.
 *
 * @param heldUntilMs no earlier than this; null with a signal.
 */
export function sentAt(atMs: number, heldUntilMs: number | null): number {
  const next = Math.ceil((atMs + SEND_AFTER_MS) / SEND_EVERY_MS) * SEND_EVERY_MS;
  return Math.max(next, heldUntilMs ?? next);
}

/** The id of an operation, by the name of what it belongs to and what it does there. */
export function opId(owner: string, label: string): string {
  return demoId(`${owner}/op/${label}`);
}

/** How far into its minute something is opened: within the first ten seconds, fixed by its name. */
export function openingDelay(name: string): number {
  return demoSeed(name) % 10_000;
}

/** How far into its minute anything else is recorded: after every opening of that minute, fixed by its name. */
export function actDelay(name: string): number {
  return 20_000 + (demoSeed(name) % 35_000);
}
