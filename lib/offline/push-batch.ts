import { PROTOCOL, SCHEMA } from '@/lib/protocol/limits';
import type { Op } from '@/lib/protocol/op';
import type { PushRequest } from '@/lib/protocol/push';
import type { LocalOp } from './local-op';
import { type NetworkRequest, REQUEST_TIMEOUT_MS } from './network';
import type { StoreMeta } from './store';

/** Most bytes of operations in one push; the office takes a little more. */
const MAX_BATCH_BYTES = 200_000;

const utf8 = new TextEncoder();

/** The operation as it goes over the wire. One saved before the first enrolment gets its device now. */
function outgoing({ op }: LocalOp, deviceId: string): Op {
  return op.deviceId === '' ? { ...op, deviceId } : op;
}

/** The longest head of the queue that fits in one push. A single operation always fits: the office judges its size. */
export function takeBatch(queue: readonly LocalOp[]): LocalOp[] {
  const batch: LocalOp[] = [];
  let bytes = 0;
  for (const row of queue) {
    bytes += utf8.encode(JSON.stringify(row.op)).length + 1;
    if (bytes > MAX_BATCH_BYTES && batch.length > 0) break;
    batch.push(row);
  }
  return batch;
}

/** The request that pushes a batch. An empty one asks whether the office takes pushes at all. */
export function pushRequest(batch: readonly LocalOp[], { epoch, deviceId }: StoreMeta): NetworkRequest {
  const ops = batch.map((row) => outgoing(row, deviceId ?? ''));
  const request: PushRequest = { protocol: PROTOCOL, schema: SCHEMA, epoch, ops };
  return {
    method: 'POST',
    path: '/api/sync/v1/push',
    body: JSON.stringify(request),
    deviceId,
    timeoutMs: REQUEST_TIMEOUT_MS,
  };
}
