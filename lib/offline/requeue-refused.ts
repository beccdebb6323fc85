import type { Store } from './store';

/** Offers again what the office refused, after the person's role has changed. */
export async function requeueRefused(store: Store): Promise<void> {
  const refused = await store.inState('refused', Infinity);
  const keys = refused.map((row) => row.key);
  await store.transact(keys, ({ ops }) => {
    const again = [...ops.values()].filter((row) => row.state === 'refused');
    return { result: undefined, ops: again.map((row) => ({ ...row, state: 'queued', seen: false })) };
  });
}
