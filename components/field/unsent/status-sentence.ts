import { countWords } from '@/components/ui/date-words';
import type { SyncStatus } from '@/lib/offline/sync-status';
import type { Trouble } from '@/lib/offline/trouble';

const TROUBLE: Readonly<Record<NonNullable<Trouble>, string>> = {
  'no-answer': 'The office does not answer just now; it is tried again by itself.',
  'no-real-connection':
    'The network here wants something first, such as a sign-in page of its own. Nothing got through.',
  'office-busy': 'The office is busy; it is tried again by itself.',
};

/** Where one's work is, as a sentence that also says what happens next. */
export function statusSentence(status: SyncStatus): string {
  const trouble = 'trouble' in status && status.trouble ? ` ${TROUBLE[status.trouble]}` : '';
  if (status.kind === 'sending') return `Sending ${status.k} of ${status.n}.`;
  if (status.kind === 'waiting')
    return `Saved on this phone. Nothing is lost.${trouble || ' It goes by itself when there is signal.'}`;
  if (status.kind === 'at-office') return `Everything is at the office.${trouble}`;
  if (status.kind === 'needs-you') return `Nothing is lost. ${countWords(status.waiting, 'item')} waiting.`;
  return 'Saved here. This phone has not heard from the office yet.';
}
