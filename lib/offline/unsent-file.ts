import * as z from 'zod';
import { type Json, canonicalJson } from '@/lib/protocol/canonical-json';
import type { Sha256 } from '@/lib/protocol/op-hash';
import { OP_SHAPE } from './answer-shapes';
import type { LocalOp } from './local-op';
import type { OpenDraft } from './make-op';
import type { Person } from './session-view';

/** Everything that goes into the file. */
export interface Unsent {
  person: Person;
  /** ISO 8601 of the phone's clock. */
  exportedAt: string;
  /** Operations in the storage that are not at the office, or not in its backup. */
  rows: readonly LocalOp[];
  /** Operations that the storage did not take. */
  notSaved: readonly OpenDraft[];
}

const NAME = 'undereave-unsent';

/** The version of the file that this app writes and reads. */
const VERSION = 1;

const draft = z.object(OP_SHAPE).omit({ bodyHash: true, n: true, hlc: true, deviceId: true });

const FILE = z.object({
  file: z.literal(NAME),
  version: z.literal(VERSION),
  exportedAt: z.string(),
  teamId: z.string(),
  teamName: z.string(),
  userId: z.string(),
  displayName: z.string(),
  ops: z.array(z.object({ state: z.string(), code: z.string().nullable(), op: z.object(OP_SHAPE) })),
  notSaved: z.array(draft),
  hash: z.string(),
});

/** A file of unsent work that was read and found whole. */
export type UnsentFile = z.output<typeof FILE>;

/** Why a file is not taken: not one of ours, written by a newer app, or not as it was written. */
export type FileFault = 'other' | 'newer' | 'changed';

/** What reading a file gives. */
export type ReadFile = { ok: true; file: UnsentFile } | { ok: false; fault: FileFault };

/** SHA-256 over the canonical text of everything but the hash itself. */
function hashOf(sha256: Sha256, content: { [key: string]: Json }): Promise<string> {
  const { hash: _hash, ...rest } = content;
  return sha256(canonicalJson(rest));
}

/** Everything that is not at the office as JSON text with its hash, to hand over by cable or message. */
export async function writeUnsentFile(sha256: Sha256, unsent: Unsent): Promise<string> {
  const { teamId, teamName, userId, displayName } = unsent.person;
  const ops = unsent.rows.map(({ op, state, code }) => ({ state, code, op }));
  const { exportedAt, notSaved } = unsent;
  const who = { teamId, teamName, userId, displayName };
  // Through text once, so that the hash is over what a reader will find.
  const content = JSON.parse(JSON.stringify({ file: NAME, version: VERSION, exportedAt, ...who, ops, notSaved }));
  return JSON.stringify({ ...content, hash: await hashOf(sha256, content) }, null, 2);
}

function parse(text: string): { [key: string]: Json } | null {
  try {
    const value: unknown = JSON.parse(text);
    const isOurs = typeof value === 'object' && value !== null && 'file' in value && value.file === NAME;
    return isOurs ? (value as { [key: string]: Json }) : null;
  } catch {
    return null;
  }
}

/** Reads such a file. A single changed character is noticed by the hash. */
export async function readUnsentFile(sha256: Sha256, text: string): Promise<ReadFile> {
  const content = parse(text);
  if (!content) return { ok: false, fault: 'other' };
  if (typeof content.version === 'number' && content.version > VERSION) return { ok: false, fault: 'newer' };
  const read = FILE.safeParse(content);
  if (!read.success || read.data.hash !== (await hashOf(sha256, content))) return { ok: false, fault: 'changed' };
  return { ok: true, file: read.data };
}
