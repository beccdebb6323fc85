/** What the browser says about this phone's storage. */
export interface StorageSpace {
  /** The browser has promised not to clear our records by itself; null when it does not say. */
  kept: boolean | null;
  /** Bytes still free for us; null when the browser does not say. */
  left: number | null;
}

/** Asks the browser to keep our records even when the phone runs short. Some ask the person, some decide alone. */
export async function keepStorage(): Promise<boolean> {
  try {
    return (await navigator.storage?.persist?.()) ?? false;
  } catch {
    return false;
  }
}

/** Asks the browser how things stand. Never fails: what it does not say is null. */
export async function readStorage(): Promise<StorageSpace> {
  try {
    const [kept, estimate] = await Promise.all([navigator.storage?.persisted?.(), navigator.storage?.estimate?.()]);
    const left = estimate?.quota === undefined ? null : estimate.quota - (estimate.usage ?? 0);
    return { kept: kept ?? null, left };
  } catch {
    return { kept: null, left: null };
  }
}

const MEGABYTE = 1_000_000;

/** Below this many megabytes a person is asked to make room. */
const LEAST_MEGABYTES = 50;

/** Is so little room left that a person should know? */
export function isLow(left: number | null): boolean {
  return left !== null && left < LEAST_MEGABYTES * MEGABYTE;
}

/** Room in words a person can weigh: `about 2,400 MB left`. */
export function spaceWords(left: number | null): string {
  if (left === null) return 'This browser does not say how much room is left.';
  const megabytes = Math.floor(left / MEGABYTE);
  if (isLow(left)) return `Only about ${megabytes} MB left. Make room on the phone.`;
  return `About ${megabytes.toLocaleString('en')} MB left for records.`;
}
