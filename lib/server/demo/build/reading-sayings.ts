import 'server-only';
import { type Random, seededRandom } from '@/lib/kit/random';
import type { Json } from '@/lib/protocol/canonical-json';
import type { CellStory, ReadingStory } from '@/lib/server/demo/story/reading-story';
import { demoSeed } from './demo-id';
import { type Draft, opId } from './draft';

/** What one operation of a reading says; the rest follows from the reading. */
export interface Saying extends Pick<Draft, 'kind' | 'body' | 'deps'> {
  /** Names the operation within its reading. */
  label: string;
  /** Milliseconds after the one before. */
  afterMs: number;
}

/** A cell takes 9 to 17 s. */
function readingPace(random: Random): number {
  return 9_000 + Math.round(8_000 * random());
}

function markBody({ q, r, state, nectar = false, unsure = false, reused }: CellStory): { [key: string]: Json } {
  return { q, r, state, nectar, unsure, ...(reused ? { reused } : {}) };
}

/** One cell: a mark, or a first mark and the one that takes its place. */
function cellSayings(cell: CellStory, label: string, { name, afterMs }: { name: string; afterMs: number }): Saying[] {
  const mark: Saying = { label, kind: 'cell.mark', afterMs, body: markBody(cell), deps: [] };
  if (!cell.pressedFirst) return [mark];
  const supersedes = opId(name, `${label}/first`);
  return [
    { ...mark, label: `${label}/first`, body: markBody({ ...cell, state: cell.pressedFirst }) },
    { ...mark, afterMs: 4_000, body: { ...mark.body, supersedes }, deps: [supersedes] },
  ];
}

function allCells({ cells, pause }: ReadingStory, name: string): Saying[] {
  const random = seededRandom(demoSeed(name));
  return cells.flatMap((cell, i) => {
    const pausedMs = pause?.afterCells === i ? pause.minutes * 60_000 : 0;
    return cellSayings(cell, `mark/${i}`, { name, afterMs: readingPace(random) + pausedMs });
  });
}

function misTapSayings({ misTap }: ReadingStory, name: string): Saying[] {
  if (!misTap) return [];
  const target = opId(name, 'mis-tap');
  return [
    { label: 'mis-tap', kind: 'cell.mark', afterMs: 7_000, body: markBody({ ...misTap, state: 'egg' }), deps: [] },
    { label: 'mis-tap/back', kind: 'cell.retract', afterMs: 2_000, body: { target }, deps: [target] },
  ];
}

function endSayings({ note, submitted }: ReadingStory): Saying[] {
  const text: Saying[] = note
    ? [
        {
          label: 'note',
          kind: 'note.set',
          afterMs: 20_000,
          body: { entity: 'reading', text: note, base: null },
          deps: [],
        },
      ]
    : [];
  return submitted ? [...text, { label: 'submit', kind: 'reading.submit', afterMs: 6_000, body: {}, deps: [] }] : text;
}

/**
 * Everything a reader records from opening a reading to submitting it, in order.
 *
 * @param name the name the reading's ids are made from; it also fixes the reader's pace.
 * @param visitOp the operation that opened the visit.
 */
export function readingSayings(story: ReadingStory, name: string, visitOp: string): Saying[] {
  const { kind, source, aid, light } = story;
  const body = { kind, source, ...(aid ? { aid } : {}), ...(light ? { light } : {}) };
  return [
    { label: 'open', kind: 'reading.open', afterMs: 0, body, deps: [visitOp] },
    ...allCells(story, name),
    ...misTapSayings(story, name),
    ...endSayings(story),
  ];
}
