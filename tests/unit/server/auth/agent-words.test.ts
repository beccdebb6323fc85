import { expect, it } from 'vitest';
import { agentWords } from '@/lib/server/auth/agent-words';

// Header texts as browsers send them, versions invented.
it.each([
  [
    'Mozilla/5.0 (Linux; Android 15; Pixel 9) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/140.0.0.0 Mobile Safari/537.36',
    'Chrome on Android',
  ],
  [
    'Mozilla/5.0 (iPhone; CPU iPhone OS 19_0 like Mac OS X) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/19.0 Mobile/15E148 Safari/604.1',
    'Safari on an iPhone',
  ],
  ['Mozilla/5.0 (Windows NT 10.0; Win64; x64; rv:145.0) Gecko/20100101 Firefox/145.0', 'Firefox on Windows'],
  [
    'Mozilla/5.0 (Windows NT 10.0; Win64; x64) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/140.0.0.0 Safari/537.36 Edg/140.0.0.0',
    'Edge on Windows',
  ],
  [
    'Mozilla/5.0 (Macintosh; Intel Mac OS X 10_15_7) AppleWebKit/605.1.15 (KHTML, like Gecko) Version/19.0 Safari/605.1.15',
    'Safari on a Mac',
  ],
  ['curl/8.5.0', 'another program'],
  ['', 'another program'],
  ['<script>alert(1)</script>', 'another program'],
])('names a browser so that its owner knows it: %s', (agent, words) => {
  expect(agentWords(agent)).toBe(words);
});
