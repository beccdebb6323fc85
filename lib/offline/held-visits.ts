import { type HeldVisit, parseCursor } from '@/lib/protocol/pull';
import type { PullAnswer } from './answer-shapes';
import type { Change, Snapshot } from './store';

/** Remembers the earliest place of a visit, so that going back misses nothing. */
function earlier(before: HeldVisit | undefined, now: HeldVisit): HeldVisit {
  const [old, fresh] = [parseCursor(before?.cursor ?? ''), parseCursor(now.cursor)];
  const isOlder = old && fresh && old.epoch === fresh.epoch && old.seq < fresh.seq;
  return before && isOlder ? before : now;
}

/**
 * Notes of which visits the office held something back. Where a visit is held no longer, because this person has
 * handed in their second reading or given it up, the log is read again from the place where its rows began: reading
 * twice is harmless, a gap would stay for good.
 *
 * @returns a change whose result tells whether the cursor went back.
 */
export function noteHeld({ held = [], epoch }: Pick<PullAnswer, 'held' | 'epoch'>) {
  return ({ meta }: Snapshot): Change<boolean> => {
    if (!meta || meta.epoch !== epoch) return { result: false };
    const before = meta.held ?? [];
    const kept = held.map((visit) =>
      earlier(
        before.find((known) => known.visit === visit.visit),
        visit,
      ),
    );
    if (before.length === 0 && kept.length === 0) return { result: false };
    const released = before.filter(({ visit }) => !held.some((still) => still.visit === visit));
    const places = released.flatMap(({ cursor }) => {
      const place = parseCursor(cursor);
      return place?.epoch === epoch ? [place.seq] : [];
    });
    const cursor = Math.min(meta.cursor, ...places);
    return { result: cursor < meta.cursor, meta: { ...meta, cursor, held: kept } };
  };
}
