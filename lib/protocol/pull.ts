import type { Op } from './op';

/** One row of the server's log: the operation as it came, with what the server knows about it. */
export interface PullRow extends Op {
  /** Gapless order of commit within the team. */
  seq: number;
  /** The user who sent it. */
  actor: string;
  /** ISO 8601 UTC. */
  receivedAt: string;
  /** Words for what was surprising: `clock`, `late`, `conflict`, `place`, … */
  flags: string[];
}

/** A visit whose other readings are kept from a second reader until theirs is handed in. */
export interface HeldVisit {
  visit: string;
  /** The cursor to read on from once the visit is no longer held. */
  cursor: string;
}

/** Answer of `GET /api/sync/v1/pull`. */
export interface PullResponse {
  protocol: number;
  epoch: number;
  serverTime: string;
  safeSeq: number;
  rows: PullRow[];
  /** The cursor after these rows: `"<epoch>:<seq>"`. */
  next: string;
  more: boolean;
  /** Left out by an office that holds nothing back. */
  held?: HeldVisit[];
}

/** Writes a pull cursor. */
export function formatCursor(epoch: number, seq: number): string {
  return `${epoch}:${seq}`;
}

/** Reads a pull cursor; null when the text is not one. */
export function parseCursor(text: string): { epoch: number; seq: number } | null {
  const match = /^(\d{1,9}):(\d{1,15})$/.exec(text);
  return match ? { epoch: Number(match[1]), seq: Number(match[2]) } : null;
}
