import type { Metadata } from 'next';
import Link from 'next/link';
import type { ReactElement } from 'react';
import { ChangesTable } from '@/components/lab/settings/changes-table';
import { CompareForm } from '@/components/lab/settings/compare-form';
import { signedWords } from '@/components/lab/settings/signed-words';
import { PageTitle } from '@/components/ui/page-title';
import { compareContent } from '@/lib/brood/team-settings/compare-content';
import { requirePage } from '@/lib/server/auth/current-session';
import { settingsAnswer, settingsVersion } from '@/lib/server/queries/settings/settings-answer';
import { foundOrAway } from '@/app/(lab)/problem-code';

export const metadata: Metadata = { title: 'Two versions of the settings' };

interface ComparePageProps {
  searchParams: Promise<{ from?: string | string[]; to?: string | string[] }>;
}

const textOf = (value: string | string[] | undefined, otherwise: number): string =>
  typeof value === 'string' ? value : String(otherwise);

/** Two versions of the settings side by side: only what differs. */
export default async function ComparePage({ searchParams }: ComparePageProps): Promise<ReactElement> {
  const session = await requirePage('settings.read');
  const { version, versions } = await settingsAnswer(session);
  const asked = await searchParams;
  const [before, after] = await foundOrAway(
    Promise.all([
      settingsVersion(session, textOf(asked.from, Math.max(0, version - 1))),
      settingsVersion(session, textOf(asked.to, version)),
    ]),
  );
  const title = (number: number) => (number === 0 ? 'Product’s defaults' : `Version ${number}`);
  return (
    <>
      <PageTitle
        under={
          <Link href="/settings" className="text-main underline underline-offset-4">
            All settings
          </Link>
        }
      >
        {title(before.version)} and {title(after.version)}
      </PageTitle>
      <CompareForm latest={version} from={before.version} to={after.version} />
      <ul className="my-4">
        {[before, after].map((signed) => (
          <li key={signed.version}>
            {signedWords(signed, session.zone)}
            {signed.reason && `: ${signed.reason}`}
          </li>
        ))}
      </ul>
      {versions.length === 0 && <p className="text-quiet">No version has been signed yet.</p>}
      <ChangesTable
        changes={compareContent(before.content, after.content)}
        titles={[title(before.version), title(after.version)]}
      />
    </>
  );
}
