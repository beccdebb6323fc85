import type { NoEstimateReason } from '@/lib/offline/brood-asker';

/** Why there is no estimate on this phone, and what becomes of the reading. */
export const NO_ESTIMATE_WORDS: Readonly<Record<NoEstimateReason, string>> = {
  'no-worker': 'This browser cannot estimate by itself. The office does once the reading is there.',
  protocol: 'The app was updated while this page was open. Close it and open it again for the estimate.',
  model: 'No estimate could be made from this reading. The office tries again once it is there.',
  timeout: 'The estimate took too long on this phone. The office makes it once the reading is there.',
};
