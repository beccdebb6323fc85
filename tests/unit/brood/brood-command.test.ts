import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import vectors from '@/tests/fixtures/brood/brood-hmm.json';

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

  it('prints the answers to a histories file as JSON', () => {
    const histories = [{ name: 'single egg', times: [20], obs: ['egg'] }];
    const { status, stdout } = run(JSON.stringify({ model: vectors.model, histories }), '--histories');
    expect(status).toBe(0);
    const [row] = (JSON.parse(stdout) as { histories: { name: string; loglik: number }[] }).histories;
    expect(row?.name).toBe('single egg');
    expect(Math.abs((row?.loglik ?? NaN) - (vectors.cases[0]?.loglik ?? NaN))).toBeLessThan(1e-8);
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
