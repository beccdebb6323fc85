import type { Metadata } from 'next';
import Link from 'next/link';
import type { ReactElement } from 'react';
import { DraftDesk } from '@/components/lab/settings/draft-desk';
import { Notice } from '@/components/ui/notice';
import { PageTitle } from '@/components/ui/page-title';
import { requirePage } from '@/lib/server/auth/current-session';
import { settingsAnswer } from '@/lib/server/queries/settings/settings-answer';

export const metadata: Metadata = { title: 'Draft of the settings' };

/** Where the lead biologist changes settings, sees what that would move, and signs. */
export default async function SettingsDraftPage(): Promise<ReactElement> {
  const session = await requirePage('settings.write');
  const { version, content, draft } = await settingsAnswer(session);
  const isStale = draft !== null && draft.basedOn !== version;
  return (
    <>
      <PageTitle
        under={
          <Link href="/settings" className="text-main underline underline-offset-4">
            Settings in force
          </Link>
        }
      >
        Draft of version {version + 1}
      </PageTitle>
      {isStale && (
        <Notice tone="warn" title="Another version was signed meanwhile">
          <p>This draft began from version {draft.basedOn}. Throw it away and start a new one to sign.</p>
        </Notice>
      )}
      <DraftDesk basedOn={draft?.basedOn ?? version} current={content} saved={draft?.content ?? null} />
    </>
  );
}
