import { afterAll, afterEach, beforeEach } from 'vitest';

/** Noise on the console is a failure: a warning that nobody reads hides the one that matters. */
const METHODS = ['debug', 'error', 'info', 'log', 'warn'] as const;
type Method = (typeof METHODS)[number];

const heard: string[] = [];
let expected: { method: Method; pattern: RegExp }[] = [];

for (const method of METHODS) {
  console[method] = (...words: unknown[]) => {
    const line = words.map(String).join(' ');
    const known = expected.some((entry) => entry.method === method && entry.pattern.test(line));
    if (!known) heard.push(`console.${method}: ${line}`);
  };
}

/** Allows console lines of this kind until the end of the test that is running. */
export function expectConsole(method: Method, pattern: RegExp): void {
  expected.push({ method, pattern });
}

function failOnNoise(): void {
  const lines = heard.splice(0);
  expected = [];
  if (lines.length > 0) throw new Error(`The console was written to:\n${lines.join('\n')}`);
}

beforeEach(failOnNoise);
afterEach(failOnNoise);
afterAll(failOnNoise);
