import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { type BrowserContext, chromium } from '@playwright/test';
import lighthouse, { desktopConfig } from 'lighthouse';
import { findChromium } from '@/lib/cli/chromium';
import { freePort } from '@/tests/support/server';
import { signInByForm } from '@/tests/support/pages/sign-in';
import { origin } from '@/tests/support/running-server';
import { WireClient } from '@/tests/support/wire/wire-client';

/** A page to be audited: the field page as a phone opens it, the lab's as a desk does. */
interface AuditedPage {
  name: string;
  as: string;
  path: string;
  desk: boolean;
}

/** Scores from 0 to 100. */
export interface PageScores {
  name: string;
  performance: number;
  accessibility: number;
  bestPractices: number;
}

const CATEGORIES = ['performance', 'accessibility', 'best-practices'];
const TECHNICIAN = 'technician@tarrow.example';
const REVIEWER = 'reviewer@tarrow.example';

async function auditedPages(): Promise<AuditedPage[]> {
  const reviewer = new WireClient(origin());
  await reviewer.signIn(REVIEWER);
  const { nests } = await reviewer.get<{ nests: { id: string }[] }>('/api/nests?q=N12');
  const nest = nests[0]?.id ?? '';
  return [
    { name: 'field', as: TECHNICIAN, path: '/field', desk: false },
    { name: 'nests', as: REVIEWER, path: '/nests', desk: true },
    { name: 'nest', as: REVIEWER, path: `/nests/${nest}`, desk: true },
    { name: 'review', as: REVIEWER, path: '/review', desk: true },
  ];
}

async function signedIn(email: string, debugPort: number, folder: string): Promise<BrowserContext> {
  const context = await chromium.launchPersistentContext(folder, {
    executablePath: findChromium(),
    args: ['--no-sandbox', '--disable-gpu', '--disable-background-networking', `--remote-debugging-port=${debugPort}`],
    baseURL: origin(),
  });
  await signInByForm(await context.newPage(), email);
  return context;
}

async function scoresOf({ name, as, path, desk }: AuditedPage): Promise<PageScores> {
  const port = await freePort();
  const folder = mkdtempSync(join(tmpdir(), 'undereave-scores-'));
  const context = await signedIn(as, port, folder);
  try {
    // The sign-in is in the browser's storage, which an audit would otherwise empty first.
    const flags = { port, onlyCategories: CATEGORIES, disableStorageReset: true, logLevel: 'error' } as const;
    const result = await lighthouse(`${origin()}${path}`, flags, desk ? desktopConfig : undefined);
    if (!result || !result.lhr.finalDisplayedUrl.endsWith(path)) throw new Error(`${name} led elsewhere`);
    const score = (id: string) => Math.round((result.lhr.categories[id]?.score ?? 0) * 100);
    const [performance, accessibility, bestPractices] = CATEGORIES.map(score);
    return {
      name,
      performance: performance ?? 0,
      accessibility: accessibility ?? 0,
      bestPractices: bestPractices ?? 0,
    };
  } finally {
    await context.close();
    rmSync(folder, { recursive: true, force: true });
  }
}

/** Audits the field page and three lab pages of the running test server with Lighthouse, one after the other. */
export async function pageScores(): Promise<PageScores[]> {
  const scores: PageScores[] = [];
  for (const page of await auditedPages()) scores.push(await scoresOf(page));
  return scores;
}
