import type { Change, Snapshot } from './store';

/**
 * Moves to the office's new epoch: its data was restored, so the log is read from the start and everything the office
 * once took is offered again. The queue stays. Does nothing when another tab has moved on meanwhile.
 *
 * @param from the epoch that the office did not know.
 * @returns a change whose result tells whether this phone moved.
 */
export function adoptEpoch(from: number, to: number) {
  return ({ meta }: Snapshot): Change<boolean> => {
    if (!meta || meta.epoch !== from || from === to) return { result: false };
    return {
      result: true,
      meta: { ...meta, epoch: to, cursor: 0, safeSeq: 0, reofferAfter: '', resync: true },
    };
  };
}
