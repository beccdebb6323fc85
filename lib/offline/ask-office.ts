import type { z } from 'zod';
import { type Verdict, classifyAnswer } from './classify-answer';
import type { DrainPorts } from './drain-ports';
import { measureSkew } from './measure-skew';
import type { NetworkRequest } from './network';

/** A sorted answer and when it came. */
export interface Heard<T> {
  verdict: Verdict<T>;
  /** The phone's clock when the answer came. */
  now: number;
  /** What the answer tells about the phone's clock. */
  skewMs: number | null;
}

function serverTimeOf(value: object): string | null {
  return 'serverTime' in value && typeof value.serverTime === 'string' ? value.serverTime : null;
}

/** Asks the office, waits, and sorts the answer. No transaction may be open meanwhile. */
export async function askOffice<T extends object>(
  { network, clock }: Pick<DrainPorts, 'network' | 'clock'>,
  request: NetworkRequest,
  shape: z.ZodType<T>,
): Promise<Heard<T>> {
  const began = clock.mono();
  const verdict = classifyAnswer(await network.send(request), shape);
  const now = clock.now();
  const serverTime = verdict.kind === 'ok' ? serverTimeOf(verdict.value) : null;
  const skewMs = serverTime === null ? null : measureSkew(serverTime, clock.mono() - began, now);
  return { verdict, now, skewMs };
}
