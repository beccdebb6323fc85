import { estimateNest } from '@/lib/brood/estimate-nest';
import { BROOD_PROTOCOL, type BroodReply, isBroodQuestion } from '@/lib/offline/brood-messages';

/** What the worker says to a message; nothing when it is no question of ours. */
export function answerBrood(message: unknown): BroodReply | null {
  if (!isBroodQuestion(message)) return null;
  const { protocol, ticket, task } = message;
  if (protocol !== BROOD_PROTOCOL) return { protocol: BROOD_PROTOCOL, ticket, kind: 'failed', code: 'protocol' };
  try {
    return { protocol: BROOD_PROTOCOL, ticket, kind: 'answer', estimate: estimateNest(task) };
  } catch {
    return { protocol: BROOD_PROTOCOL, ticket, kind: 'failed', code: 'model' };
  }
}
