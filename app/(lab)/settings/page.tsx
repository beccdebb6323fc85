import type { Metadata } from 'next';
import Link from 'next/link';
import type { ReactElement } from 'react';
import { ConfusionTable } from '@/components/lab/settings/confusion-table';
import { DurationsTable } from '@/components/lab/settings/durations-table';
import { NumbersTable } from '@/components/lab/settings/numbers-table';
import { signedWords } from '@/components/lab/settings/signed-words';
import { VersionsList } from '@/components/lab/settings/versions-list';
import { ownsSettings } from '@/components/shell/role-words';
import { buttonLook } from '@/components/ui/button-look';
import { PageTitle } from '@/components/ui/page-title';
import { requirePage } from '@/lib/server/auth/current-session';
import { settingsAnswer } from '@/lib/server/queries/settings/settings-answer';

export const metadata: Metadata = { title: 'Settings' };

/** Every number behind the dates, with its trust and source, and who signed it. */
export default async function SettingsPage(): Promise<ReactElement> {
  const session = await requirePage('settings.read');
  const { content, versions, draft, ...signed } = await settingsAnswer(session);
  const isOwner = ownsSettings(session.role);
  return (
    <>
      <PageTitle
        under={signedWords(signed, session.zone)}
        act={
          isOwner && (
            <Link href="/settings/draft" className={buttonLook('main', 'lab')}>
              {draft ? 'Go on with the draft' : 'Work on a draft'}
            </Link>
          )
        }
      >
        Settings
      </PageTitle>
      <p className="max-w-text">
        Every date of the brood rests on these numbers. Few of them are published for these wasps, so each says how far
        it can be trusted and where it comes from. {isOwner ? 'You sign' : 'The lead biologist signs'} new versions;
        estimates keep the version they were made with.{' '}
        <Link href="/settings/learning" className="text-main underline underline-offset-4">
          What your own readings say about them
        </Link>
      </p>
      <DurationsTable {...content} />
      <NumbersTable values={content.values} />
      <ConfusionTable confusion={content.confusion} />
      <VersionsList versions={versions} zone={session.zone} />
    </>
  );
}
