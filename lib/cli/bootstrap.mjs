#!/usr/bin/env node
// The first step of every npm script: plain Node, no packages. Installs them when they are missing or out of date,
// then hands over to the TypeScript command: `node lib/cli/bootstrap.mjs start`.
import { spawn } from 'node:child_process';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { packagesOutdated } from './installed-packages.mjs';
import { lockPath, withLock } from './pid-lock.mjs';

const OLDEST_NODE = [20, 9];
const root = join(dirname(fileURLToPath(import.meta.url)), '..', '..');

/** Ends with words for a person. @param {string[]} lines */
function fail(...lines) {
  for (const line of lines) console.error(line);
  process.exit(1);
}

function checkNode() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  if (major > OLDEST_NODE[0] || (major === OLDEST_NODE[0] && minor >= OLDEST_NODE[1])) return;
  fail(
    `Node ${process.versions.node} is too old: version ${OLDEST_NODE.join('.')} or newer is needed (https://nodejs.org).`,
  );
}

/** Runs `npm ci` with its own output shown. @returns {Promise<number>} its exit code */
function npmCi() {
  return new Promise((resolve, reject) => {
    const child = spawn('npm', ['ci', '--include=dev', '--no-audit', '--no-fund'], { cwd: root, stdio: 'inherit' });
    child.on('error', reject);
    child.on('close', (code) => resolve(code ?? 1));
  });
}

async function install() {
  const reason = packagesOutdated(root);
  if (!reason) return;
  const started = performance.now();
  const elapsed = () => `${Math.round((performance.now() - started) / 1000)} s`;
  console.log(`packages: ${reason}; running npm ci (a minute or two, about 1 GB on disk) ...`);
  const beat = setInterval(() => console.log(`packages: still installing (${elapsed()}) ...`), 20_000);
  const code = await npmCi().finally(() => clearInterval(beat));
  if (code !== 0) {
    fail(
      `packages: npm ci ended with code ${code} after ${elapsed()}.`,
      'It needs the registry shown by "npm config get registry". Run "npm ci" by hand to see the whole message.',
    );
  }
  console.log(`packages: installed in ${elapsed()}`);
}

async function handOver() {
  const [command = '', ...rest] = process.argv.slice(2);
  if (!/^[a-z-]+$/.test(command)) fail('usage: node lib/cli/bootstrap.mjs <command> [options]');
  const { register } = await import('tsx/esm/api');
  register({ tsconfig: join(root, 'lib', 'cli', 'tsconfig.json') });
  process.argv = [process.argv[0], join(root, 'lib', 'cli', `${command}.ts`), ...rest];
  await import(`./${command}.ts`);
}

checkNode();
process.chdir(root);
if (packagesOutdated(root)) {
  const waiting = (pid) => console.log(`packages: waiting for another installation (process ${pid}) ...`);
  await withLock(lockPath(root, 'install'), install, waiting);
}
await handOver();
