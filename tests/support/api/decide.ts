import * as amendRoute from '@/app/api/readings/[id]/amend/route';
import * as lockRoute from '@/app/api/readings/[id]/lock/route';
import * as readingRoute from '@/app/api/readings/[id]/route';
import * as settleRoute from '@/app/api/readings/[id]/settle/route';
import type { ReadingAnswer } from '@/lib/server/presenters/present-reading';
import { callApi } from '@/tests/support/factories/call-api';
import type { TestMember } from '@/tests/support/factories/make-team';

/** What a reviewer sends about one cell. */
export interface SentCell {
  q: unknown;
  r: unknown;
  state: unknown;
  reason?: unknown;
  pick?: unknown;
}

const BECAUSE = 'The photo shows it.';

/** `POST /api/readings/<id>/settle`; a cell without a reason gets one. */
export function settle(as: TestMember, id: string, cells: readonly SentCell[]): Promise<Response> {
  const body = { cells: cells.map((cell) => ({ reason: BECAUSE, ...cell })) };
  return callApi(settleRoute, 'POST', { as, params: { id }, body });
}

/** `POST /api/readings/<id>/lock`. */
export function lock(as: TestMember, id: string): Promise<Response> {
  return callApi(lockRoute, 'POST', { as, params: { id }, body: {} });
}

/** `POST /api/readings/<id>/amend`. */
export function amend(as: TestMember, id: string, reason: unknown = 'A later photo.'): Promise<Response> {
  return callApi(amendRoute, 'POST', { as, params: { id }, body: { reason } });
}

/** The answer about a decision that was taken. */
export async function decided(response: Response): Promise<{ reading: string; version: number }> {
  if (response.status !== 200) throw new Error(`expected a decision, got ${response.status} ${await response.text()}`);
  return (await response.json()) as { reading: string; version: number };
}

/** `GET /api/readings/<id>` of a reading that can be seen. */
export async function readReading(as: TestMember, id: string): Promise<ReadingAnswer> {
  const response = await callApi(readingRoute, 'GET', { as, params: { id } });
  if (response.status !== 200) throw new Error(`expected a reading, got ${response.status} ${await response.text()}`);
  return (await response.json()) as ReadingAnswer;
}
