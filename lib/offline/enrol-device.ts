import { ENROL_ANSWER, HEALTH_ANSWER } from './answer-shapes';
import { askOffice } from './ask-office';
import { type DrainPorts, type StepEnd, endOf } from './drain-ports';
import { PROBE_TIMEOUT_MS, REQUEST_TIMEOUT_MS } from './network';
import type { Change, Snapshot } from './store';

/** The epoch the office lives in now; null when it does not answer. */
export async function officeEpoch(ports: Pick<DrainPorts, 'network' | 'clock'>): Promise<number | null> {
  const request = { method: 'GET', path: '/api/health', timeoutMs: PROBE_TIMEOUT_MS } as const;
  const { verdict } = await askOffice(ports, request, HEALTH_ANSWER);
  return verdict.kind === 'ok' ? verdict.value.epoch : null;
}

/** The first enrolment also tells the epoch; a later one leaves it, so that a restore is noticed and answered. */
function nameDevice(deviceId: string, epoch: number) {
  return ({ meta }: Snapshot): Change<void> => ({
    result: undefined,
    meta: meta ? { ...meta, deviceId, deviceEpoch: epoch, epoch: meta.epoch === 0 ? epoch : meta.epoch } : undefined,
  });
}

/** Enrols this phone for this person. The key is kept before the device is used. */
export async function enrolDevice(
  ports: Pick<DrainPorts, 'network' | 'clock' | 'store' | 'label' | 'keepDevice'>,
): Promise<StepEnd> {
  const { store, label, keepDevice } = ports;
  const body = JSON.stringify({ label });
  const request = { method: 'POST', path: '/api/sync/v1/enrol', body, timeoutMs: REQUEST_TIMEOUT_MS } as const;
  const { verdict } = await askOffice(ports, request, ENROL_ANSWER);
  if (verdict.kind !== 'ok') return endOf(verdict, 0);
  const { deviceId, deviceKey, epoch } = verdict.value;
  await keepDevice({ deviceId, deviceKey });
  await store.transact([], nameDevice(deviceId, epoch));
  return null;
}
