import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { dataDir } from '@/lib/server/env';
import { runChild } from './child';
import { type Counts, NOTHING, countPlaywright, countVitest, withExitCode } from './counts';
import type { CommandContext } from './run-command';

/** A test program that leaves a JSON report behind. */
interface ReportedRun {
  label: string;
  script: string;
  args: readonly string[];
  env?: Record<string, string>;
  report: string;
  count(report: object): Counts;
}

function reportPath(name: string): string {
  const folder = join(dataDir(), 'results');
  mkdirSync(folder, { recursive: true });
  return join(folder, `${name}.json`);
}

function readReport(path: string): object | null {
  if (!existsSync(path)) return null;
  const report: unknown = JSON.parse(readFileSync(path, 'utf8'));
  return typeof report === 'object' ? report : null;
}

/** Runs a test program with its output shown and counts its report; no report at all is one failure. */
async function runReported(run: ReportedRun, { progress, signal }: CommandContext): Promise<Counts> {
  rmSync(run.report, { force: true });
  const { code } = await progress.step(run.label, () =>
    runChild({
      command: process.execPath,
      args: [join('node_modules', run.script), ...run.args],
      env: run.env,
      output: 'show',
      signal,
    }),
  );
  const report = readReport(run.report);
  return withExitCode(report ? run.count(report) : NOTHING, code);
}

/** Runs vitest projects, such as `unit` and `property`. */
export async function runVitest(projects: readonly string[], context: CommandContext): Promise<Counts> {
  const report = reportPath(projects.join('-'));
  const reporters = ['--reporter=default', '--reporter=json', `--outputFile.json=${report}`];
  const chosen = projects.flatMap((name) => ['--project', name]);
  return runReported(
    {
      label: `tests: ${projects.join(' and ')}`,
      script: 'vitest/vitest.mjs',
      args: ['run', '--config', 'tests/config/vitest.config.ts', ...chosen, ...reporters],
      report,
      count: countVitest,
    },
    context,
  );
}

/** Runs the browser tests. */
export async function runPlaywright(context: CommandContext): Promise<Counts> {
  const report = reportPath('e2e');
  return runReported(
    {
      label: 'tests: e2e in Chromium',
      script: '@playwright/test/cli.js',
      args: ['test', '--config', 'tests/config/playwright.config.ts', '--reporter=list,json'],
      env: { PLAYWRIGHT_JSON_OUTPUT_FILE: report },
      report,
      count: countPlaywright,
    },
    context,
  );
}
