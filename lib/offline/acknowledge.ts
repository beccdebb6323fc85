import type { Store } from './store';

/** Notes that a person has looked at refused and set-aside operations: they stay listed but ask for nobody any more. */
export function acknowledge(store: Store, keys: readonly string[]): Promise<void> {
  return store.transact(keys, ({ ops }) => ({
    result: undefined,
    ops: [...ops.values()].map((row) => ({ ...row, seen: true })),
  }));
}
