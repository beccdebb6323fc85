import { existsSync } from 'node:fs';
import { runChild } from './child';
import { CommandError } from './command-error';
import type { CommandContext } from './run-command';

const PLACES = ['/usr/bin/chromium', '/usr/bin/chromium-browser', '/usr/bin/google-chrome'];
const BY_HAND = 'apt-get update && apt-get install -y --no-install-recommends chromium';

/** The browser of this machine: `CHROMIUM` when set, else where the packages put it; undefined when there is none. */
export function findChromium(): string | undefined {
  return [process.env.CHROMIUM ?? '', ...PLACES].find((path) => path !== '' && existsSync(path));
}

/**
 * Makes sure there is a browser, installing Debian's Chromium when we may.
 *
 * @throws CommandError that says what to run when it cannot be installed.
 */
export async function requireChromium({ progress, signal }: CommandContext): Promise<void> {
  if (findChromium()) return;
  const missing = 'The browser tests need Chromium, which is not installed.';
  if (!existsSync('/usr/bin/apt-get')) throw new CommandError(`${missing}\nInstall it and set CHROMIUM to its path.`);
  if (process.getuid?.() !== 0) throw new CommandError(`${missing}\nRun this once as root:\n  ${BY_HAND}`);
  const { code, output } = await progress.step('installing Chromium from Debian (about 90 MB)', () =>
    runChild({
      command: 'sh',
      args: ['-c', BY_HAND],
      env: { DEBIAN_FRONTEND: 'noninteractive' },
      output: 'keep',
      signal,
    }),
  );
  if (code === 0 && findChromium()) return;
  const lastLines = output.trimEnd().split('\n').slice(-5).join('\n');
  throw new CommandError(`${lastLines}\n${missing}\nInstalling it failed. By hand, as root:\n  ${BY_HAND}`);
}
