import { expect, test } from 'vitest';
import { installState } from '@/components/field/install/install-state';

const IPHONE =
  'Mozilla/5.0 (iPhone; CPU iPhone OS 18_4 like Mac OS X) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/18.4 Mobile/15E148 Safari/604.1';
const MAC =
  'Mozilla/5.0 (Macintosh; Intel Mac OS X 10_15_7) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/18.4 Safari/605.1.15';
const ANDROID =
  'Mozilla/5.0 (Linux; Android 15) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/140.0.0.0 Mobile Safari/537.36';

const facts = { standalone: false, canPrompt: false, userAgent: ANDROID, touchPoints: 5 };

test.each([
  ['an app opened from the home screen', { ...facts, standalone: true }, 'installed'],
  ['a browser that offers to ask', { ...facts, canPrompt: true }, 'prompt'],
  ['Safari on a phone', { ...facts, userAgent: IPHONE }, 'safari'],
  ['Safari on a tablet, which calls itself a Mac', { ...facts, userAgent: MAC }, 'safari'],
  ['Safari on a Mac', { ...facts, userAgent: MAC, touchPoints: 0 }, 'menu'],
  ['a browser that has not offered', facts, 'menu'],
])('%s', (_what, given, state) => {
  expect(installState(given)).toBe(state);
});
