import * as z from 'zod';
import { PROTOCOL } from '@/lib/protocol/limits';

const json = z.json();
const whole = z.number().int().min(0);
const ours = { protocol: z.literal(PROTOCOL), epoch: whole, serverTime: z.string() };

/** One result of a push. Outcomes of newer offices are strings we do not know; those operations stay queued. */
const pushResult = z.object({
  opId: z.unknown(),
  r: z.string(),
  seq: whole.optional(),
  bodyHash: z.unknown(),
  code: z.string().optional(),
});

/** Answer of a push, as far as the phone relies on it. */
export const PUSH_ANSWER = z.object({ ...ours, safeSeq: whole, results: z.array(pushResult) });

/** The members of an operation as they travel. */
export const OP_SHAPE = {
  v: z.literal(1),
  opId: z.string(),
  kind: z.string(),
  kindV: z.number(),
  deviceId: z.string(),
  n: z.number(),
  nest: z.string().nullable(),
  visit: z.string().nullable(),
  reading: z.string().nullable(),
  at: z.object({ wall: z.string(), mono: z.number(), boot: z.string(), skewMs: z.number().nullable() }),
  hlc: z.string(),
  deps: z.array(z.string()),
  body: z.record(z.string(), json),
  bodyHash: z.string(),
};

const pullRow = z.object({
  ...OP_SHAPE,
  seq: whole.min(1),
  actor: z.string(),
  receivedAt: z.string(),
  flags: z.array(z.string()),
});

/** Answer of a pull. */
export const PULL_ANSWER = z.object({
  ...ours,
  safeSeq: whole,
  rows: z.array(pullRow),
  next: z.string(),
  more: z.boolean(),
  held: z.array(z.object({ visit: z.string(), cursor: z.string() })).optional(),
});

/** Answer to "have you got these?". */
export const HAVE_ANSWER = z.object({ ...ours, have: z.array(z.string()) });

/** Answer of an enrolment. */
export const ENROL_ANSWER = z.object({
  deviceId: z.string(),
  deviceKey: z.string(),
  epoch: whole,
  serverTime: z.string(),
});

/** Answer of the health route. */
export const HEALTH_ANSWER = z.object({ ok: z.literal(true), epoch: whole });

const person = z.object({ id: z.string(), name: z.string() });

/** Answer of `/api/me`. */
export const ME_ANSWER = z.object({
  user: person,
  team: person.extend({ zone: z.string() }),
  role: z.enum(['technician', 'reviewer', 'biologist', 'coordinator', 'researcher']),
  members: z.array(person),
});

export type PushAnswer = z.output<typeof PUSH_ANSWER>;
export type PullAnswer = z.output<typeof PULL_ANSWER>;
