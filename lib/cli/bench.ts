import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { runChild } from './child';
import { findChromium } from './chromium';
import { CommandError } from './command-error';
import { startDatabaseServer } from './database-server';
import { type CommandContext, runCommand } from './run-command';
import { applyTestEnvironment } from './test-environment.mjs';
import { takeTestTurn } from './test-turn';

/** What can be measured, each by the file of its name in `tests/bench`. */
const BENCHES: ReadonlySet<string> = new Set(['brood', 'pages']);
const USAGE = `usage: npm run bench -- ${[...BENCHES].join(' | ')} [options]`;

/** The program that reads TypeScript, as an address Node can import before it starts a file. */
function loader(): string {
  return pathToFileURL(join(process.cwd(), 'node_modules', 'tsx', 'dist', 'esm', 'index.mjs')).href;
}

/** The pages are measured on the tests' database with the demo season, served by the finished build. */
async function preparePages(context: CommandContext): Promise<void> {
  if (!existsSync(join('.next', 'BUILD_ID'))) {
    throw new CommandError('There is no build to measure. Make one first:\n  npm run build');
  }
  if (!findChromium())
    throw new CommandError('There is no Chromium to measure with: install it, or name it in CHROMIUM.');
  takeTestTurn(context);
  await startDatabaseServer(context);
}

applyTestEnvironment();

/**
 * `npm run bench -- brood | pages`: prints measured figures and judges none. The bench is a process of its own, since
 * commands may not import tests, and so that its memory is only its own.
 */
await runCommand(async (context) => {
  const [name = '', ...rest] = process.argv.slice(2);
  if (!BENCHES.has(name)) throw new CommandError(USAGE);
  if (name === 'pages') await preparePages(context);
  const { code } = await runChild({
    command: process.execPath,
    args: ['--import', loader(), join('tests', 'bench', `${name}.ts`), ...rest],
    env: { TSX_TSCONFIG_PATH: join('lib', 'cli', 'tsconfig.json') },
    output: 'show',
    signal: context.signal,
  });
  return { code };
});
