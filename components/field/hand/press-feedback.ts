import type { RecorderView } from '@/lib/offline/recorder-view';

/** What a change of the recorder's view means for hand and ear. */
export type Feedback = 'kept' | 'not-kept' | null;

type Seen = Pick<RecorderView, 'saved' | 'unsaved'>;

/** Did a press become kept, or turn out not to be? */
export function feedbackOf(before: Seen, after: Seen): Feedback {
  if (after.unsaved.length > before.unsaved.length) return 'not-kept';
  return after.saved > before.saved ? 'kept' : null;
}

/** Milliseconds of buzz and pause: one short buzz, or two long ones. */
export const BUZZ: Readonly<Record<NonNullable<Feedback>, number[]>> = { kept: [20], 'not-kept': [60, 40, 60] };

/** A voice as the browser lists it. */
export type Voice = Pick<SpeechSynthesisVoice, 'lang' | 'localService' | 'default'>;

/** An English voice that speaks on the device itself; null when there is none, because others need the network. */
export function localVoice<T extends Voice>(voices: readonly T[]): T | null {
  const local = voices.filter((voice) => voice.localService && voice.lang.toLowerCase().startsWith('en'));
  return local.find((voice) => voice.default) ?? local[0] ?? null;
}
