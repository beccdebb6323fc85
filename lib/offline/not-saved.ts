import type { OpDraft } from './local-op';

/** Why the phone could not keep something. `cleared`: the browser has emptied our storage. */
export type NotSavedReason = 'full' | 'cleared' | 'timeout' | 'storage';

/** The storage was emptied while the app was open. */
export class StorageCleared extends Error {
  override name = 'StorageCleared';
}

/** What a person entered is not in the phone's storage. It carries it, so that it can be retried or exported. */
export class NotSavedError extends Error {
  override name = 'NotSavedError';

  constructor(
    readonly reason: NotSavedReason,
    readonly drafts: readonly OpDraft[],
    cause: unknown,
  ) {
    super(`not saved: ${reason}`, { cause });
  }
}

/** The name an error goes by, and that of the error inside it. */
function namesOf(error: unknown): string[] {
  if (typeof error !== 'object' || error === null) return [];
  const name = 'name' in error ? [String(error.name)] : [];
  const inner = 'inner' in error ? namesOf(error.inner) : [];
  return [...name, ...inner];
}

/** Sorts a storage failure. A full disk reports itself as an aborted transaction with the quota error inside. */
export function notSavedReason(error: unknown): NotSavedReason {
  const names = namesOf(error);
  if (names.includes('QuotaExceededError')) return 'full';
  if (names.includes('StorageCleared')) return 'cleared';
  if (names.includes('TimedOut')) return 'timeout';
  return 'storage';
}
