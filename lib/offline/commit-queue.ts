import type { Op } from '@/lib/protocol/op';
import { type OpenDraft, sealOp } from './make-op';
import { NotSavedError, type NotSavedReason } from './not-saved';
import type { Sha256 } from '@/lib/protocol/op-hash';
import type { CommitEntry } from './commit-op';
import type { RecorderPlace } from './recorder-view';

/** What the queue saves with, and whom it tells. */
export interface CommitQueuePorts {
  sha256: Sha256;
  /** Saves an entry; rejects with `NotSavedError`. */
  commit(entry: CommitEntry): Promise<Op[]>;
  /** The transaction of these operations has completed. */
  saved(ops: readonly Op[]): void;
  /** Everything in `waiting()` is not saved. */
  failed(reason: NotSavedReason): void;
}

/** A line of operations on their way to the disk. */
export interface CommitQueue {
  /** Adds operations, or only the place. Resolves when they are saved; rejects when the attempt failed. */
  add(drafts: readonly OpenDraft[], place: RecorderPlace): Promise<void>;
  /** Tries again to save what failed. */
  retry(): void;
  /** What is not saved, in order. */
  waiting(): readonly OpenDraft[];
}

/**
 * Saves operations strictly in the order they were made. What comes while a transaction runs goes into the next one
 * together. When one fails, everything behind it waits as well: a later press may build on an earlier one, and must
 * never reach the office without it.
 */
export function createCommitQueue(ports: CommitQueuePorts): CommitQueue {
  let waiting: OpenDraft[] = [];
  let place: RecorderPlace | undefined;
  let running: Promise<void> | null = null;

  async function saveAll(): Promise<void> {
    do {
      const [batch, at] = [waiting, place];
      const drafts = await Promise.all(batch.map((draft) => sealOp(ports, draft)));
      const ops = await ports.commit({ drafts, place: at });
      waiting = waiting.slice(batch.length);
      if (place === at) place = undefined;
      ports.saved(ops);
    } while (waiting.length > 0 || place);
  }

  function run(): Promise<void> {
    running ??= saveAll()
      .catch((error: unknown) => {
        ports.failed(error instanceof NotSavedError ? error.reason : 'storage');
        throw error;
      })
      .finally(() => {
        running = null;
      });
    return running;
  }

  return {
    add: (drafts, at) => {
      waiting = [...waiting, ...drafts];
      place = at;
      return run();
    },
    retry: () => {
      if (waiting.length > 0) run().catch(() => undefined);
    },
    waiting: () => waiting,
  };
}
