import { cellKey } from '@/lib/comb/axial';
import type { Axial } from '@/lib/comb/axial';
import type { Mark } from '@/lib/comb/mark';
import type { CellState } from '@/lib/comb/states';
import { CombRecorder } from '@/lib/offline/recorder';
import { startPlace } from '@/lib/offline/recorder-state';
import type { Recorder } from '@/lib/offline/recorder-view';
import type { Desk, Mode } from '@/components/field/recorder/desk';
import { NEST, READING, VISIT, countingMaker, id } from '@/tests/support/sim/local-ops';
import { ManualTimers } from '@/tests/support/sim/manual-timers';

/** A mark of the last visit. */
export function earlierMark(cell: Axial, state: CellState, number: number): Mark {
  return {
    ...cell,
    state,
    nectar: false,
    unsure: false,
    reused: false,
    scrap: false,
    instar: null,
    note: null,
    opId: id(900_000 + number),
    hlc: `1.${number}`,
    supersedes: null,
    at: '2026-06-03T05:41:00.000-04:00',
  };
}

/** The product's own recorder on a disk that takes everything, as a screen holds it. `now()` is its latest state. */
export function openRecorder(last: readonly Mark[] = []) {
  const core = new CombRecorder(
    { maker: countingMaker(new ManualTimers()), commit: () => Promise.resolve([]) },
    {
      reading: READING,
      nest: NEST,
      visit: VISIT,
      mayMark: true,
      submitted: false,
      marks: [],
      retracted: new Set(),
      last: new Map(last.map((mark) => [cellKey(mark), mark])),
      place: startPlace(READING),
      pending: [],
      failure: null,
      saved: 0,
      lastWords: null,
    },
  );
  const now = (): Recorder => {
    const { press, paint, paintAll, toggle, jump, skip, unskip, expect, undo, submit, retryUnsaved } = core;
    return {
      view: core.view.get(),
      press,
      paint,
      paintAll,
      toggle,
      jump,
      skip,
      unskip,
      expect,
      undo,
      submit,
      retryUnsaved,
    };
  };
  return { now };
}

/** A desk around the recorder that keeps its mode in a box and counts how often it was asked about a marked cell. */
export function openDesk(last: readonly Mark[] = []) {
  const { now } = openRecorder(last);
  const box = { mode: { kind: 'walk' } as Mode, asked: 0 };
  const desk = (): Desk => ({
    recorder: now(),
    mode: box.mode,
    setMode: (mode) => {
      box.mode = mode;
    },
    detail: {},
    setDetail: () => undefined,
    expected: new Map(),
    marked: () => undefined,
    askNoCell: () => {
      box.asked += 1;
    },
  });
  return { now, desk, box };
}
