import 'server-only';
import type { ReadingStory } from '@/lib/server/demo/story/reading-story';
import { demoId } from './demo-id';
import { instantOf } from './demo-time';
import { type Draft, openingDelay, opId, sentAt } from './draft';
import { readingSayings } from './reading-sayings';

/** Where a reading hangs, and on which clock it was made. */
export interface ReadingPlace {
  /** The name its ids are made from. */
  name: string;
  nest: string;
  visit: string;
  /** The operation that opened the visit. */
  visitOp: string;
  offset: string;
  /** Held back with the whole visit, epoch milliseconds; null with a signal. */
  heldMs: number | null;
}

/** The operations of one reading, in the order its reader made them. */
export function readingDrafts(story: ReadingStory, place: ReadingPlace): Draft[] {
  const { name, nest, visit, visitOp, offset } = place;
  const heldMs = story.heldUntil ? instantOf(story.heldUntil, offset) : place.heldMs;
  const reading = demoId(name);
  let atMs = instantOf(story.openedAt, offset) + openingDelay(name);
  return readingSayings(story, name, visitOp).map(({ label, kind, body, afterMs, deps }) => {
    atMs += afterMs;
    return {
      opId: opId(name, label),
      by: story.by,
      atMs,
      sentMs: sentAt(atMs, heldMs),
      kind,
      nest,
      visit,
      reading,
      deps,
      body,
    };
  });
}
