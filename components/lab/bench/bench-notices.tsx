import Link from 'next/link';
import type { ReactElement, ReactNode } from 'react';
import { Notice } from '@/components/ui/notice';
import type { ReadingView, ReviewView } from '@/components/lab/lab-shapes';

interface BenchNoticesProps {
  nest: string;
  reading: ReadingView;
  review: ReviewView;
  /** May the reader settle? */
  settles: boolean;
}

function Line({ children }: { children: ReactNode }): ReactElement {
  return (
    <Notice className="mb-4">
      <p>{children}</p>
    </Notice>
  );
}

/** What to know before reading or settling: why nothing can be changed here, what is still moving, where the final one is. */
export function BenchNotices({ nest, reading, review: { final }, settles }: BenchNoticesProps): ReactElement {
  const isSourceOfFinal = final !== null && final.basedOn === reading.id;
  return (
    <>
      {!settles && (
        <Line>
          You can read this. Reviewers and the lead biologist settle readings; nobody changes the observer’s marks.
        </Line>
      )}
      {isSourceOfFinal && (
        <Line>
          The lab has settled this reading.{' '}
          <Link href={`/nests/${nest}/readings/${final.id}`} className="underline">
            Open the final reading
          </Link>
          {settles && ' to settle more cells.'}
        </Line>
      )}
      {reading.submittedAt === null && <Line>This reading is still open: more marks may come from the phone.</Line>}
      {final?.stale && (
        <Notice tone="warn" title="Marks came later" className="mb-4">
          <p>
            Marks reached the office after the final reading was made. They are in{' '}
            <Link href={`/nests/${nest}/readings/${final.basedOn}`} className="underline">
              the reading it was made from
            </Link>{' '}
            and do not move the final one.
          </p>
        </Notice>
      )}
    </>
  );
}
