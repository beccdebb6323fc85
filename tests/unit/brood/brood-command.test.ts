import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';

const folder = mkdtempSync(join(tmpdir(), 'brood-command-'));
afterAll(() => rmSync(folder, { recursive: true }));

/** Runs the command on a file with this text. */
function run(text: string, door = '--nest') {
  const file = join(folder, 'input.json');
  writeFileSync(file, text);
  const { status, stdout, stderr } = spawnSync(process.execPath, ['--import', 'tsx', 'lib/cli/brood.ts', door, file], {
    encoding: 'utf8',
  });
  return { status, stdout, stderr };
}

describe('the brood command', { timeout: 30_000 }, () => {
  it('prints the estimate of a nest file as JSON', () => {
    const nest = {
      readings: [{ at: '2026-06-16T05:35:00-04:00', marks: [{ q: 0, r: 0, state: 'capped' }] }],
      taxon: 'Polistes fuscatus',
    };
    const { status, stdout, stderr } = run(JSON.stringify(nest));
    expect([status, stderr]).toEqual([0, '']);
    const answer = JSON.parse(stdout) as { inputDigest: string; cells: unknown[] };
    expect(answer.cells).toHaveLength(1);
    expect(answer.inputDigest).toMatch(/^[0-9a-f]{64}$/);
  });

  it('leaves with 2 and one line naming the field when the file is malformed', () => {
    const { status, stdout, stderr } = run('{"readings":[{"at":"yesterday","marks":[]}]}');
    expect([status, stdout]).toEqual([2, '']);
    expect(stderr).toMatch(/^readings\[0\]\.at: .*\n$/);
  });

  it('leaves with 2 and the usage when it is asked for something else', () => {
    expect(run('{}', '--comb')).toMatchObject({ status: 2, stdout: '', stderr: expect.stringMatching(/^usage: /) });
  });
});
