import * as enrolRoute from '@/app/api/sync/v1/enrol/route';
import * as pullRoute from '@/app/api/sync/v1/pull/route';
import * as pushRoute from '@/app/api/sync/v1/push/route';
import type { EnrolResponse } from '@/lib/protocol/enrol';
import { PROTOCOL, SCHEMA } from '@/lib/protocol/limits';
import type { PullResponse } from '@/lib/protocol/pull';
import type { PushResponse } from '@/lib/protocol/push';
import { callApi } from '@/tests/support/factories/call-api';
import type { TestMember } from '@/tests/support/factories/make-team';

/** An enrolled phone of a member, speaking to the route handlers in process. */
export interface Phone {
  member: TestMember;
  deviceId: string;
  /** Headers of its requests. */
  headers: Record<string, string>;
}

/** Enrols a phone. */
export async function enrol(member: TestMember, label = 'field phone'): Promise<Phone> {
  const response = await callApi(enrolRoute, 'POST', { as: member, body: { label } });
  const { deviceId } = (await response.json()) as EnrolResponse;
  return { member, deviceId, headers: { 'x-device': deviceId } };
}

/** The body of a push with right versions. */
export function pushBody(ops: readonly unknown[], more: Record<string, unknown> = {}): Record<string, unknown> {
  return { protocol: PROTOCOL, schema: SCHEMA, epoch: 1, ops, ...more };
}

/** Sends a body, or text, to the push route. */
export async function postPush(phone: Phone, body: unknown, headers: Record<string, string> = {}): Promise<Response> {
  return callApi(pushRoute, 'POST', { as: phone.member, body, headers: { ...phone.headers, ...headers } });
}

/** Pushes operations and gives the answer. */
export async function push(phone: Phone, ops: readonly unknown[]): Promise<PushResponse> {
  return (await (await postPush(phone, pushBody(ops))).json()) as PushResponse;
}

/** Pulls a page. */
export async function pull(phone: Phone, query = ''): Promise<PullResponse> {
  const response = await callApi(pullRoute, 'GET', { as: phone.member, query, headers: phone.headers });
  return (await response.json()) as PullResponse;
}
