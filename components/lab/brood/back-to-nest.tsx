import Link from 'next/link';
import type { ReactElement } from 'react';

/** The way back from a part of a nest to its page. */
export function BackToNest({ nest }: { nest: string }): ReactElement {
  return (
    <p className="print-hidden -mt-2 mb-4">
      <Link href={`/nests/${nest}`} className="inline-flex min-h-6 items-center text-main underline underline-offset-4">
        Visits, readings and outcome of this nest
      </Link>
    </p>
  );
}
