import type { LocalOp } from './local-op';
import type { OpenDraft } from './make-op';
import type { Person } from './session-view';

/** Everything that goes into the file. */
export interface Unsent {
  person: Person;
  /** ISO 8601 of the phone's clock. */
  exportedAt: string;
  /** Operations in the storage that are not at the office. */
  rows: readonly LocalOp[];
  /** Operations that the storage did not take. */
  notSaved: readonly OpenDraft[];
}

/** Everything that is not at the office as JSON text, to hand over by cable or message. */
export function exportUnsent({ person, exportedAt, rows, notSaved }: Unsent): string {
  const { teamId, teamName, userId, displayName } = person;
  const ops = rows.map(({ op, state, code }) => ({ state, code, op }));
  const file = {
    file: 'undereave-unsent',
    version: 1,
    exportedAt,
    teamId,
    teamName,
    userId,
    displayName,
    ops,
    notSaved,
  };
  return JSON.stringify(file, null, 2);
}
