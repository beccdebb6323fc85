'use client';

import { useState } from 'react';
import { cellKey } from '@/lib/comb/axial';
import type { PressDetail, Recorder } from '@/lib/offline/recorder-view';
import type { Desk, Mode } from './desk';

const NO_DETAIL: PressDetail = {};

/** The recorder with its mode, and with the note and instar that wait for the current cell: they never move to another. */
export function useDesk(recorder: Recorder, around: Pick<Desk, 'askNoCell' | 'expected' | 'marked'>): Desk {
  const [mode, setMode] = useState<Mode>({ kind: 'walk' });
  const [waiting, setWaiting] = useState({ key: '', detail: NO_DETAIL });
  const { current } = recorder.view;
  const key = current ? cellKey(current) : '';
  const detail = waiting.key === key ? waiting.detail : NO_DETAIL;
  return { recorder, mode, setMode, detail, setDetail: (next) => setWaiting({ key, detail: next }), ...around };
}
