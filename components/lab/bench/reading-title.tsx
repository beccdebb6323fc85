import Link from 'next/link';
import type { ReactElement } from 'react';
import type { ReadingView, ReviewView } from '@/components/lab/lab-shapes';
import { kindWords, nestLine, sourceWords } from '@/components/lab/lab-words';
import { momentWords } from '@/components/ui/date-words';
import { PageTitle } from '@/components/ui/page-title';
import { sentence } from '@/components/ui/sentence';

interface ReadingTitleProps {
  nest: { id: string; code: string; name: string | null };
  reading: ReadingView;
  final: ReviewView['final'];
  zone: string;
}

/** The version in words: `version 2, locked` or `version 2, open; version 1 was locked`. */
function versionWords({ version, lockedVersion }: NonNullable<ReviewView['final']>): string {
  if (version === lockedVersion) return `version ${version}, locked`;
  return lockedVersion === null
    ? `version ${version}, open`
    : `version ${version}, open; version ${lockedVersion} was locked`;
}

/** Which reading of which nest is on the bench, by whom, from what, and how far it is. */
export function ReadingTitle({ nest, reading, final, zone }: ReadingTitleProps): ReactElement {
  const standing = reading.submittedAt === null ? 'still open' : `handed in ${momentWords(reading.submittedAt, zone)}`;
  return (
    <>
      <p className="print-hidden mb-2">
        <Link
          href={`/nests/${nest.id}?reading=${reading.id}`}
          className="inline-flex min-h-6 items-center text-main underline underline-offset-4"
        >
          {nestLine(nest)}
        </Link>
      </p>
      <PageTitle
        under={`by ${reading.observer}, ${sourceWords(reading.source)}, ${reading.kind === 'final' && final ? versionWords(final) : standing}`}
      >
        {sentence(kindWords(reading.kind))} of {nest.code}
      </PageTitle>
    </>
  );
}
