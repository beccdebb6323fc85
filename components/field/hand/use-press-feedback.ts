'use client';

import { useEffect, useRef } from 'react';
import { spokenWords } from '@/components/field/words/spoken-words';
import type { RecorderView } from '@/lib/offline/recorder-view';
import { BUZZ, feedbackOf, localVoice } from './press-feedback';
import { useHand } from './use-hand';

/** Can this phone buzz? Safari cannot. */
export function canBuzz(): boolean {
  return typeof navigator !== 'undefined' && 'vibrate' in navigator;
}

/** The voice this phone would read with, without the network; null when it has none. */
export function ownVoice(): SpeechSynthesisVoice | null {
  return typeof speechSynthesis === 'undefined' ? null : localVoice(speechSynthesis.getVoices());
}

function say(words: string): void {
  const voice = ownVoice();
  if (!voice || words === '') return;
  const speech = new SpeechSynthesisUtterance(words);
  speech.voice = voice;
  speech.lang = voice.lang;
  // Only the last mark is of interest: a quick hand is not followed by a long tail of words.
  speechSynthesis.cancel();
  speechSynthesis.speak(speech);
}

/** Buzzes and speaks after presses, where this phone can and is set to. Never the only sign of anything. */
export function usePressFeedback(view: RecorderView): void {
  const { buzz, speak } = useHand();
  const before = useRef(view);
  useEffect(() => {
    const feedback = feedbackOf(before.current, view);
    const hasNewWords = view.lastWords !== before.current.lastWords;
    before.current = view;
    if (buzz && feedback && canBuzz()) navigator.vibrate(BUZZ[feedback]);
    if (speak && feedback === 'not-kept') say('Not saved');
    else if (speak && hasNewWords) say(spokenWords(view.lastWords, view.tally.cellsTotal, view.expectedTotal));
  }, [view, buzz, speak]);
}
