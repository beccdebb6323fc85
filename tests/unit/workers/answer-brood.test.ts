import { describe, expect, test } from 'vitest';
import { estimateNest } from '@/lib/brood/estimate-nest';
import { BROOD_PROTOCOL, type BroodTask } from '@/lib/offline/brood-messages';
import { answerBrood } from '@/workers/answer-brood';

const AT = Date.parse('2026-06-16T12:00:00Z');
const TASK: BroodTask = {
  nest: 'nest',
  zone: 'America/New_York',
  asOf: AT,
  taxon: null,
  readings: [{ id: 'r', at: AT, marks: [{ q: 0, r: 0, state: 'large' }] }],
};
const ask = (part: object = {}) => answerBrood({ protocol: BROOD_PROTOCOL, ticket: 7, task: TASK, ...part });

describe('the worker', () => {
  test('answers with the estimate everybody else gets, under the same ticket', () => {
    expect(ask()).toEqual({ protocol: BROOD_PROTOCOL, ticket: 7, kind: 'answer', estimate: estimateNest(TASK) });
  });

  test('answers with something that can be sent', () => {
    expect(structuredClone(ask())).toEqual(ask());
  });

  test('says which version it speaks when it is asked in another', () => {
    expect(ask({ protocol: 0 })).toMatchObject({ kind: 'failed', code: 'protocol', ticket: 7 });
  });

  test('says that it could not, instead of falling over', () => {
    expect(ask({ task: { ...TASK, zone: 'Nowhere/At-All' } })).toMatchObject({ kind: 'failed', code: 'model' });
  });

  test.each([null, 'hello', 7, {}, { ticket: 1 }, { protocol: 1, ticket: 'a', task: {} }])(
    'keeps silent at %j, which is no question',
    (message) => {
      expect(answerBrood(message)).toBeNull();
    },
  );
});
