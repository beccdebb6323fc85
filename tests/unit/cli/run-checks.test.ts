import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import type { CommandContext } from '@/lib/cli/run-command';
import { runChecks } from '@/lib/cli/run-checks';
import { expectConsole } from '@/tests/support/console-guard';

const home = process.cwd();
let folder: string;

beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'undereave-checks-'));
  mkdirSync(join(folder, 'node_modules'));
  writeFileSync(join(folder, 'node_modules', 'good.mjs'), '');
  writeFileSync(join(folder, 'node_modules', 'bad.mjs'), "console.log('line 7 is wrong'); process.exit(2);");
  process.chdir(folder);
});

afterAll(() => {
  process.chdir(home);
  rmSync(folder, { recursive: true });
});

function context(): CommandContext & { started: string[] } {
  const started: string[] = [];
  return {
    started,
    progress: { note: () => {}, step: (label, work) => (started.push(label), work()) },
    signal: new AbortController().signal,
    atEnd: () => {},
  };
}

test('every check runs, also after one that failed, and each counts as one', async () => {
  expectConsole('log', /line 7 is wrong\n--- second: not right/);
  const step = (name: string, script: string) => ({ name, script, args: [] });
  const watched = context();
  const counts = await runChecks(watched, [
    [step('first', 'good.mjs'), step('second', 'bad.mjs'), step('third', 'good.mjs')],
    [step('beside', 'good.mjs')],
  ]);
  expect(counts).toEqual({ passed: 3, failed: 1 });
  expect(watched.started.sort()).toEqual(['check: beside', 'check: first', 'check: second', 'check: third']);
});
