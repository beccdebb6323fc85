import { execFileSync } from 'node:child_process';
import { type BrowserContext, type Page, chromium } from '@playwright/test';
import { findChromium } from '@/lib/cli/chromium';

/** A phone: a browser whose profile outlives it. */
export interface Phone {
  context: BrowserContext;
  page: Page;
}

const ARGS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-dev-shm-usage',
];

/** Opens the browser on a profile folder, at phone size. */
export async function phoneOn(profile: string, baseURL: string): Promise<Phone> {
  const context = await chromium.launchPersistentContext(profile, {
    executablePath: findChromium(),
    args: ARGS,
    viewport: { width: 390, height: 844 },
    hasTouch: true,
    timezoneId: 'America/New_York',
    baseURL,
  });
  return { context, page: context.pages()[0] ?? (await context.newPage()) };
}

/** Process ids of every browser process that works on the profile. */
function processesOf(profile: string): number[] {
  const list = execFileSync('ps', ['-eo', 'pid=,args='], { encoding: 'utf8', maxBuffer: 16 * 1024 * 1024 });
  return list
    .split('\n')
    .filter((line) => line.includes(`--user-data-dir=${profile}`))
    .map((line) => Number.parseInt(line, 10));
}

/** Ends the whole browser at once with SIGKILL, as an empty battery would. */
export async function killPhone(profile: string, { context }: Phone): Promise<void> {
  for (const pid of processesOf(profile)) {
    try {
      process.kill(pid, 'SIGKILL');
    } catch {
      // Gone already: ending one of them takes others with it.
    }
  }
  await context.close().catch(() => undefined);
}
