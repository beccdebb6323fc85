'use client';

import { type ReactElement, useEffect, useEffectEvent, useState } from 'react';
import { PersonProvider } from '@/components/field/parts/person-context';
import { buttonLook } from '@/components/ui/button-look';
import { LoadingLines } from '@/components/ui/loading-lines';
import { Notice } from '@/components/ui/notice';
import { useOwnSecond } from '@/lib/offline/hooks/use-own-second';
import { useRecorder } from '@/lib/offline/hooks/use-recorder';
import { useSession } from '@/lib/offline/hooks/use-session';
import { useSyncStatus } from '@/lib/offline/hooks/use-sync-status';
import { BenchDesk } from './bench-desk';
import { StartSecond } from './start-second';
import type { VisitRef } from './visit-ref';

interface SecondBenchProps {
  at: VisitRef;
  /** The own reading the office knows of; null before it is begun. */
  reading: string | null;
}

/** After handing in: the first reading can be seen once this one is at the office. */
function HandedIn({ visit }: { visit: string }): ReactElement {
  const { status, words } = useSyncStatus();
  const isThere = status.kind === 'at-office';
  return (
    <Notice live="polite" title={isThere ? 'Your reading is at the office.' : 'Your reading is saved here.'}>
      <p>{isThere ? 'Both readings can be compared now.' : `It goes to the office by itself: ${words}.`}</p>
      {isThere && (
        <a href={`/review/${visit}`} className={buttonLook('main', 'lab', 'mt-3 min-h-11')}>
          Compare both readings
        </a>
      )}
    </Notice>
  );
}

interface OpenReadingProps extends Pick<SecondBenchProps, 'at'> {
  reading: string;
  /** Cells counted when it was begun, to be taken over once. */
  counted: number | null;
}

function OpenReading({ at, reading, counted }: OpenReadingProps): ReactElement {
  const recorder = useRecorder(reading);
  const takeCount = useEffectEvent(() => {
    if (recorder && counted !== null && recorder.view.expectedTotal === null) recorder.expect(counted);
  });
  const isLoaded = Boolean(recorder);
  useEffect(() => {
    if (isLoaded) takeCount();
  }, [isLoaded]);
  if (recorder === undefined) return <LoadingLines what="Your reading" />;
  if (recorder === null) {
    return (
      <Notice title="Your reading is still on its way here.">
        <p>You began it in another browser. It opens as soon as this one has fetched it from the office.</p>
      </Notice>
    );
  }
  return recorder.view.submitted ? <HandedIn visit={at.visit} /> : <BenchDesk recorder={recorder} title={at.title} />;
}

function BenchOf({ at, reading }: SecondBenchProps): ReactElement {
  const kept = useOwnSecond(at.visit);
  const [begun, setBegun] = useState<{ reading: string; counted: number | null } | null>(null);
  const open = begun?.reading ?? kept ?? reading;
  if (open) return <OpenReading at={at} reading={open} counted={begun?.counted ?? null} />;
  if (kept === undefined) return <LoadingLines what="Your reading" />;
  return <StartSecond at={at} onStarted={(id, counted) => setBegun({ reading: id, counted })} />;
}

/**
 * A blind second reading in the lab. Every press is an operation that this browser keeps at once and sends by itself, as
 * on the phone: a kill, a closed lid or a lost network costs nothing.
 */
export function SecondBench(props: SecondBenchProps): ReactElement {
  const { view } = useSession();
  if (view.kind === 'loading') return <LoadingLines what="Your reading" />;
  if (view.kind === 'signed-out') {
    return (
      <Notice tone="warn" title="This browser does not know you yet.">
        <p>The office did not answer. Reload the page once it does; nothing you marked here is lost.</p>
      </Notice>
    );
  }
  return (
    <PersonProvider person={view.person}>
      <BenchOf {...props} />
    </PersonProvider>
  );
}
