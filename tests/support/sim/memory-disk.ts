import type { Lease } from '@/lib/offline/lease-row';
import type { LocalOp } from '@/lib/offline/local-op';
import type { RecorderPlace } from '@/lib/offline/recorder-view';
import type { Change, Snapshot, StoreMeta } from '@/lib/offline/store';

/** What is on a phone's disk. Rows are never changed in place, so a copy is a cloned phone. */
export class MemoryDisk {
  meta: StoreMeta | null = null;
  lease: Lease | null = null;
  ops = new Map<string, LocalOp>();
  places = new Map<string, RecorderPlace>();

  /** What a transaction over these keys reads. */
  snapshot(keys: readonly string[]): Snapshot {
    const ops = new Map<string, LocalOp>();
    for (const key of keys) {
      const row = this.ops.get(key);
      if (row) ops.set(key, row);
    }
    return { meta: this.meta, ops };
  }

  /** Writes a change whole. */
  write(change: Change<unknown>): void {
    if (change.meta) this.meta = change.meta;
    for (const row of change.ops ?? []) this.ops.set(row.key, row);
    if (change.place) this.places.set(change.place.reading, change.place);
    if (change.keepEpoch === undefined) return;
    for (const row of this.ops.values()) {
      if (row.state === 'remote' && row.epoch !== change.keepEpoch) this.ops.delete(row.key);
    }
  }

  /** The rows in a state, by an order. */
  select(keep: (row: LocalOp) => boolean, order: (row: LocalOp) => number | string, limit: number): LocalOp[] {
    const rows = [...this.ops.values()].filter(keep);
    rows.sort((a, b) => Number(order(a) > order(b)) - Number(order(a) < order(b)));
    return rows.slice(0, limit);
  }

  /** The browser empties our storage. */
  clear(): void {
    this.meta = null;
    this.lease = null;
    this.ops.clear();
    this.places.clear();
  }

  /** A second phone with the same contents. */
  clone(): MemoryDisk {
    const copy = new MemoryDisk();
    copy.meta = this.meta;
    copy.ops = new Map(this.ops);
    copy.places = new Map(this.places);
    return copy;
  }
}
