import { answerBrood } from './answer-brood';

declare const self: DedicatedWorkerGlobalScope;

// Estimates run here, so that a key press in the recorder never waits for one.
self.addEventListener('message', ({ data }: MessageEvent<unknown>) => {
  const reply = answerBrood(data);
  if (reply) self.postMessage(reply);
});
