import 'server-only';
import { idKey } from './id-key';
import type { ReadingRow } from './reading-rows';

/**
 * The version at which a final reading was last locked, by `idKey` of that reading and of the one it is based on,
 * which reports it too.
 */
export function lockedVersions(readings: readonly ReadingRow[]): Map<string, number | null> {
  const versions = new Map<string, number | null>();
  for (const { kind, id, based_on, locked_version } of readings) {
    if (kind !== 'final') continue;
    versions.set(idKey(id), locked_version);
    if (based_on) versions.set(idKey(based_on), locked_version);
  }
  return versions;
}
