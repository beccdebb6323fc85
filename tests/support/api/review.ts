import * as acceptRoute from '@/app/api/readings/[id]/accept/route';
import * as queueRoute from '@/app/api/review/route';
import * as claimRoute from '@/app/api/visits/[id]/claim/route';
import * as primaryRoute from '@/app/api/visits/[id]/primary/route';
import * as releaseRoute from '@/app/api/visits/[id]/release/route';
import type { QueueItem, ReviewQueue } from '@/lib/server/queries/review/review-queue';
import { callApi } from '@/tests/support/factories/call-api';
import type { TestMember } from '@/tests/support/factories/make-team';

/** `GET /api/review`. */
export async function queue(as: TestMember): Promise<ReviewQueue> {
  const response = await callApi(queueRoute, 'GET', { as });
  if (response.status !== 200) throw new Error(`expected the queue, got ${response.status}`);
  return (await response.json()) as ReviewQueue;
}

/** What the queue says about one visit; undefined when it waits for nothing. */
export async function queued(as: TestMember, visit: string): Promise<QueueItem | undefined> {
  return (await queue(as)).waiting.find((item) => item.visit === visit);
}

/** `POST /api/visits/<id>/claim`. */
export function claim(as: TestMember, visit: string): Promise<Response> {
  return callApi(claimRoute, 'POST', { as, params: { id: visit }, body: {} });
}

/** `POST /api/visits/<id>/release`. */
export function release(as: TestMember, visit: string): Promise<Response> {
  return callApi(releaseRoute, 'POST', { as, params: { id: visit }, body: {} });
}

/** `POST /api/visits/<id>/primary`. */
export function choose(as: TestMember, visit: string, reading: string): Promise<Response> {
  return callApi(primaryRoute, 'POST', { as, params: { id: visit }, body: { reading, reason: 'In better light.' } });
}

/** `POST /api/readings/<id>/accept`. */
export function accept(as: TestMember, reading: string): Promise<Response> {
  return callApi(acceptRoute, 'POST', { as, params: { id: reading }, body: {} });
}
