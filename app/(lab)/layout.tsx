import { redirect } from 'next/navigation';
import type { ReactElement, ReactNode } from 'react';
import { PageHelp } from '@/components/lab/help/page-help';
import { CautionsLine } from '@/components/shell/cautions-line';
import { LabHeader } from '@/components/shell/lab-header';
import { OfflineNotice } from '@/components/shell/offline-notice';
import { QueryProvider } from '@/components/shell/query-provider';
import { SkipLink } from '@/components/shell/skip-link';
import { currentSession } from '@/lib/server/auth/current-session';

// Lab pages carry a nonce and belong to whoever is signed in: none is ever built ahead.
export const dynamic = 'force-dynamic';

/** The frame of every lab page: header, the page, cautions. */
export default async function LabLayout({ children }: { children: ReactNode }): Promise<ReactElement> {
  const session = await currentSession();
  if (!session) redirect('/sign-in');
  const { displayName, role, teamName } = session;
  return (
    <QueryProvider>
      <SkipLink />
      <div className="flex min-h-dvh flex-col">
        <LabHeader person={{ displayName, role, teamName }} />
        <main id="main" tabIndex={-1} className="mx-auto w-full max-w-page grow px-4 pt-6 outline-none sm:px-6">
          <OfflineNotice />
          <PageHelp />
          {children}
        </main>
        <CautionsLine />
      </div>
    </QueryProvider>
  );
}
