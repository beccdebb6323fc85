import type { ReactElement } from 'react';
import { momentWords } from '@/components/ui/date-words';
import type { AmendmentView } from '@/components/lab/lab-shapes';
import type { LockView } from './review-shapes';

interface LocksListProps {
  locks: readonly LockView[];
  amendments: readonly AmendmentView[];
  zone: string;
  year: string;
}

function peopleWords({ field, second, settled, lockedBy }: LockView): string {
  return [
    `read in the field by ${field}`,
    second ? `blind by ${second}` : 'not read a second time',
    settled.length > 0 ? `settled by ${settled.join(' and ')}` : 'nothing to settle',
    `locked by ${lockedBy}`,
  ].join(', ');
}

/** Every locked version, with who stands behind it, the settings that applied, and the hash of its cells. */
export function LocksList({ locks, amendments, zone, year }: LocksListProps): ReactElement {
  return (
    <ol className="list-none">
      {locks.map((lock) => {
        const opened = amendments.find(({ version }) => version === lock.version);
        return (
          <li key={lock.version} className="keep-together border-b border-rule py-2">
            <p>
              <span className="font-bold">Version {lock.version}</span>, {momentWords(lock.at, zone, year)}:{' '}
              {peopleWords(lock)}. Settings version {lock.settingsVersion}.
            </p>
            {opened && (
              <p className="[overflow-wrap:anywhere]">
                Opened because: {opened.reason} <span className="text-quiet">({opened.actor})</span>
              </p>
            )}
            <p className="font-mono text-sm [overflow-wrap:anywhere]">SHA-256 {lock.hash}</p>
          </li>
        );
      })}
    </ol>
  );
}
