import { describe, expect, test } from 'vitest';
import { BroodAsker, type BroodWorker, type WorkerListener } from '@/lib/offline/brood-asker';
import { BROOD_PROTOCOL, type BroodQuestion, type BroodTask } from '@/lib/offline/brood-messages';
import { ManualTimers } from '@/tests/support/sim/manual-timers';
import { answerBrood } from '@/workers/answer-brood';

const TASK: BroodTask = {
  nest: 'nest',
  zone: 'America/New_York',
  asOf: Date.parse('2026-06-16T12:00:00Z'),
  taxon: null,
  readings: [{ id: 'r', at: Date.parse('2026-06-16T12:00:00Z'), marks: [{ q: 0, r: 0, state: 'egg' }] }],
};

/** A worker that keeps what it is asked until the test lets it speak. */
function heldWorkers() {
  const made: { asked: BroodQuestion[]; listener: WorkerListener; stopped: boolean }[] = [];
  const makeWorker = (listener: WorkerListener): BroodWorker => {
    const held = { asked: [] as BroodQuestion[], listener, stopped: false };
    made.push(held);
    return {
      // A real worker gets a copy, and refuses what cannot be copied.
      post: (question) => held.asked.push(structuredClone(question)),
      stop: () => {
        held.stopped = true;
      },
    };
  };
  const speak = (worker = 0, question = 0) => {
    const held = made[worker];
    held?.listener.said(structuredClone(answerBrood(held.asked[question])));
  };
  return { made, makeWorker, speak };
}

describe('asking the worker', () => {
  test('gives the estimate, and lets the worker go with the last answer', async () => {
    const { made, makeWorker, speak } = heldWorkers();
    const { ask } = new BroodAsker({ makeWorker, timers: new ManualTimers() });
    const [first, second] = [ask(TASK), ask({ ...TASK, nest: 'other' })];
    expect(made).toHaveLength(1);
    speak(0, 1);
    expect((await second).nest.id).toBe('other');
    expect(made[0]?.stopped).toBe(false);
    speak(0, 0);
    expect((await first).nest.id).toBe('nest');
    expect(made[0]?.stopped).toBe(true);
  });

  test('makes a new worker for a later question', async () => {
    const { made, makeWorker, speak } = heldWorkers();
    const { ask } = new BroodAsker({ makeWorker, timers: new ManualTimers() });
    const first = ask(TASK);
    speak();
    await first;
    const second = ask(TASK);
    speak(1);
    await second;
    expect(made).toHaveLength(2);
  });

  test('says so where there are no workers, and when the file does not load', async () => {
    const none = new BroodAsker({
      makeWorker: () => {
        throw new ReferenceError('Worker is not defined');
      },
      timers: new ManualTimers(),
    });
    await expect(none.ask(TASK)).rejects.toMatchObject({ reason: 'no-worker' });
    const { made, makeWorker } = heldWorkers();
    const broken = new BroodAsker({ makeWorker, timers: new ManualTimers() }).ask(TASK);
    made[0]?.listener.broken();
    await expect(broken).rejects.toMatchObject({ reason: 'no-worker' });
  });

  test('does not wait for ever', async () => {
    const { made, makeWorker } = heldWorkers();
    const timers = new ManualTimers();
    const answer = new BroodAsker({ makeWorker, timers }).ask(TASK);
    const late = expect(answer).rejects.toMatchObject({ reason: 'timeout' });
    await timers.pass(60_001);
    await late;
    expect(made[0]?.stopped).toBe(true);
  });

  test('does not take the word of another version', async () => {
    const { made, makeWorker } = heldWorkers();
    const answer = new BroodAsker({ makeWorker, timers: new ManualTimers() }).ask(TASK);
    made[0]?.listener.said({ protocol: BROOD_PROTOCOL + 1, ticket: 1, kind: 'answer', estimate: {} });
    await expect(answer).rejects.toMatchObject({ reason: 'protocol' });
  });
});
