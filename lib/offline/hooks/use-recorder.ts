'use client';

import { useEffect, useState, useSyncExternalStore } from 'react';
import type { CombRecorder } from '@/lib/offline/recorder';
import type { Recorder, RecorderView } from '@/lib/offline/recorder-view';
import { useRecords } from './use-standing';

/** A recorder once it is loaded, and what it was loaded for. */
interface Loaded {
  reading: string;
  core: CombRecorder | null;
}

/** How long until a reading that could not be loaded is asked for again. */
const RETRY_MS = 2_000;

const nothing = () => () => undefined;

/** The view of a recorder, as it changes. */
function useRecorderView(core: CombRecorder | null): RecorderView | null {
  const subscribe = core ? core.view.subscribe : nothing;
  return useSyncExternalStore(
    subscribe,
    () => core?.view.get() ?? null,
    () => null,
  );
}

/** The comb recorder of one reading; undefined while loading, null when the reading is not on this phone. */
export function useRecorder(readingId: string): Recorder | null | undefined {
  const records = useRecords();
  const [loaded, setLoaded] = useState<Loaded | null>(null);
  useEffect(() => {
    if (!records) return;
    let current = true;
    let again: ReturnType<typeof setTimeout> | undefined;
    const load = () => {
      const show = (core: CombRecorder | null) => current && setLoaded({ reading: readingId, core });
      const retry = () => {
        if (current) again = setTimeout(load, RETRY_MS);
      };
      records.recorder(readingId).then(show, retry);
    };
    load();
    return () => {
      current = false;
      clearTimeout(again);
      records.closeRecorder(readingId);
    };
  }, [records, readingId]);
  const present = loaded?.reading === readingId ? loaded : null;
  const view = useRecorderView(present?.core ?? null);
  if (!present) return undefined;
  return present.core && view && recorderOf(present.core, view);
}

function recorderOf(core: CombRecorder, view: RecorderView): Recorder {
  const { press, paint, paintAll, toggle, jump, skip, unskip, expect, undo, submit, retryUnsaved } = core;
  return { view, press, paint, paintAll, toggle, jump, skip, unskip, expect, undo, submit, retryUnsaved };
}
