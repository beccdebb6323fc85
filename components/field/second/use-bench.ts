'use client';

import { useEffect, useEffectEvent, useState } from 'react';
import type { Axial } from '@/lib/comb/axial';
import type { Recorder } from '@/lib/offline/recorder-view';
import { type BenchMemory, FRESH_MEMORY, goTo, runBench } from './bench-acts';
import { type BenchCommand, benchCommand } from './bench-keys';

/** The bench: its memory, and what its keys do. */
export interface Bench {
  recorder: Recorder;
  memory: BenchMemory;
  run: (command: BenchCommand) => void;
  go: (place: Axial) => void;
}

/** Is the person typing, or is a question open over the bench? Then letters are not marks. */
function isElsewhere(target: EventTarget | null): boolean {
  return target instanceof Element && target.closest('input, textarea, select, dialog') !== null;
}

/** A key held down walks on, but never marks cell after cell. */
function mayRepeat({ do: what }: BenchCommand): boolean {
  return what === 'step' || what === 'neighbour';
}

/** The keyboard of the bench, wherever the focus is. @param finish called by the key that ends the reading. */
export function useBench(recorder: Recorder, finish: () => void): Bench {
  const [memory, setMemory] = useState(FRESH_MEMORY);
  const run = (command: BenchCommand): void => {
    if (command.do === 'finish') finish();
    else setMemory(runBench(recorder, memory, command));
  };
  const onKey = useEffectEvent((event: KeyboardEvent) => {
    if (event.defaultPrevented || isElsewhere(event.target)) return;
    const command = benchCommand(event);
    if (!command) return;
    event.preventDefault();
    if (!event.repeat || mayRepeat(command)) run(command);
  });
  useEffect(() => {
    const listener = (event: KeyboardEvent): void => onKey(event);
    document.addEventListener('keydown', listener);
    return () => document.removeEventListener('keydown', listener);
  }, []);
  return { recorder, memory, run, go: (place) => setMemory(goTo(recorder, memory, place)) };
}
