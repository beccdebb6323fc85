import Link from 'next/link';
import type { ReactElement } from 'react';
import { Section } from '@/components/ui/section';
import { signedWords } from './signed-words';
import type { SignedView } from './settings-shapes';

interface VersionsListProps {
  /** Newest first. */
  versions: readonly SignedView[];
  zone: string;
}

const LINK = 'text-main underline underline-offset-4';

/** Every signed version with its reason, and what it changed. */
export function VersionsList({ versions, zone }: VersionsListProps): ReactElement {
  return (
    <Section id="versions" title="Versions" className="mt-8">
      {versions.length === 0 && <p className="text-quiet">None has been signed yet.</p>}
      <ol className="flex flex-col gap-3">
        {versions.map((signed) => (
          <li key={signed.version} className="keep-together">
            <p className="font-bold">{signedWords(signed, zone)}</p>
            {signed.reason && <p className="[overflow-wrap:anywhere] whitespace-pre-line">{signed.reason}</p>}
            <p>
              <Link className={LINK} href={`/settings/compare?from=${signed.version - 1}&to=${signed.version}`}>
                What version {signed.version} changed
              </Link>
            </p>
          </li>
        ))}
      </ol>
    </Section>
  );
}
