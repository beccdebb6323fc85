import type { Network, NetworkAnswer, NetworkRequest } from '@/lib/offline/network';
import { jsonAnswer } from './model-server';

/** What a test says the office answers to one request. */
export type Script = (request: NetworkRequest) => NetworkAnswer | Promise<NetworkAnswer>;

/** A network that answers as a test says and remembers what was asked. */
export class ScriptedNetwork implements Network {
  readonly asked: NetworkRequest[] = [];

  constructor(public script: Script) {}

  async send(request: NetworkRequest): Promise<NetworkAnswer> {
    this.asked.push(request);
    return this.script(request);
  }

  /** The paths asked for, without their queries. */
  paths(): string[] {
    return this.asked.map(({ path }) => path.split('?')[0] ?? '');
  }
}

/** Nobody answers. */
export const NO_ANSWER: NetworkAnswer = { kind: 'none', why: 'network' };

/** An error answer of our office. */
export function problemAnswer(status: number, code: string, more: object = {}): NetworkAnswer {
  return jsonAnswer(status, { type: 'about:blank', title: code, status, code, requestId: 'r', ...more });
}

export { jsonAnswer };
