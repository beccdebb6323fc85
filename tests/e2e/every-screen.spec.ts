import AxeBuilder from '@axe-core/playwright';
import { type Page, expect, test } from '@playwright/test';
import { signedInPerson, useSignIn } from '@/tests/support/pages/sign-in';
import { screenshotPath } from '@/tests/support/pages/screenshots';

/** A screen to look at: who looks, where, and a name for its picture. */
interface Screen {
  name: string;
  as: string | null;
  path: (known: KnownIds) => string;
}

interface KnownIds {
  nest: string;
  visit: string;
  reading: string;
}

const REVIEWER = 'reviewer@tarrow.example';
const SCREENS: readonly Screen[] = [
  { name: 'sign-in', as: null, path: () => '/sign-in' },
  { name: 'not-found', as: null, path: () => '/nothing-here' },
  { name: 'no-access', as: 'technician@tarrow.example', path: () => '/no-access' },
  { name: 'nests', as: REVIEWER, path: () => '/nests' },
  { name: 'nests-none-found', as: REVIEWER, path: () => '/nests?q=zzzz' },
  { name: 'nest', as: REVIEWER, path: ({ nest }) => `/nests/${nest}` },
  { name: 'nest-brood', as: REVIEWER, path: ({ nest }) => `/nests/${nest}/brood` },
  { name: 'nest-brood-as-researcher', as: 'researcher@tarrow.example', path: ({ nest }) => `/nests/${nest}/brood` },
  { name: 'reading', as: REVIEWER, path: ({ nest, reading }) => `/nests/${nest}/readings/${reading}` },
  {
    name: 'reading-as-technician',
    as: 'technician@tarrow.example',
    path: ({ nest, reading }) => `/nests/${nest}/readings/${reading}`,
  },
  { name: 'review', as: REVIEWER, path: () => '/review' },
  { name: 'review-visit', as: REVIEWER, path: ({ visit }) => `/review/${visit}` },
  { name: 'second-reading-not-taken', as: REVIEWER, path: ({ visit }) => `/review/${visit}/read` },
  { name: 'agreement', as: REVIEWER, path: () => '/agreement' },
  { name: 'agreement-as-technician', as: 'technician@tarrow.example', path: () => '/agreement' },
  { name: 'agreement-as-biologist', as: 'biologist@tarrow.example', path: () => '/agreement' },
  { name: 'hosts', as: 'coordinator@tarrow.example', path: () => '/hosts' },
  { name: 'downloads', as: 'coordinator@tarrow.example', path: () => '/downloads' },
  { name: 'members', as: 'coordinator@tarrow.example', path: () => '/members' },
  { name: 'letters', as: 'coordinator@tarrow.example', path: () => '/letters' },
  { name: 'phones', as: 'coordinator@tarrow.example', path: () => '/phones' },
  { name: 'phones-own', as: 'technician@tarrow.example', path: () => '/phones' },
  { name: 'account', as: 'researcher@tarrow.example', path: () => '/account' },
  { name: 'start', as: 'coordinator@tarrow.example', path: () => '/start' },
  { name: 'tour', as: REVIEWER, path: () => '/tour' },
  { name: 'tour-without-demo', as: 'coordinator@ossle.example', path: () => '/tour' },
  { name: 'limits', as: REVIEWER, path: () => '/limits' },
  { name: 'reset', as: null, path: () => '/reset' },
  { name: 'reset-closed', as: null, path: () => '/reset/not-a-link' },
  { name: 'invitation-closed', as: null, path: () => '/invitation/not-a-link' },
  { name: 'field-signed-out', as: null, path: () => '/field' },
  { name: 'field-nests', as: 'technician@tarrow.example', path: () => '/field' },
  { name: 'field-new-nest', as: 'technician@tarrow.example', path: () => '/field/nests/new' },
  { name: 'field-nest', as: 'technician@tarrow.example', path: ({ nest }) => `/field/nests/${nest}` },
  { name: 'field-visit', as: 'technician@tarrow.example', path: ({ visit }) => `/field/visits/${visit}` },
  { name: 'field-reading', as: 'technician@tarrow.example', path: ({ reading }) => `/field/readings/${reading}` },
  { name: 'field-unsent', as: 'technician@tarrow.example', path: () => '/field/unsent' },
  { name: 'field-bring-in', as: 'technician@tarrow.example', path: () => '/field/unsent/bring-in' },
  { name: 'field-sheet', as: 'technician@tarrow.example', path: ({ nest }) => `/field/nests/${nest}/sheet` },
  { name: 'field-typed', as: 'technician@tarrow.example', path: ({ visit }) => `/field/visits/${visit}/typed` },
  { name: 'field-settings', as: 'technician@tarrow.example', path: () => '/field/settings' },
];

const SIZES = [
  { width: 390, height: 844 },
  { width: 1280, height: 800 },
] as const;

interface NestAnswer {
  visits: { id: string; readings: { id: string; kind: string }[] }[];
}

async function bandstandRoof(): Promise<KnownIds> {
  const reviewer = await signedInPerson(REVIEWER);
  const { nests } = await reviewer.get<{ nests: { id: string; code: string }[] }>('/api/nests?q=N12');
  const nest = nests.find(({ code }) => code === 'N12')?.id ?? '';
  const { visits } = await reviewer.get<NestAnswer>(`/api/nests/${nest}`);
  const visit = visits.find(({ readings }) => readings.some(({ kind }) => kind === 'final'));
  return { nest, visit: visit?.id ?? '', reading: visit?.readings.find(({ kind }) => kind === 'field')?.id ?? '' };
}

/** Waits until what the page asks for has come and nothing on it is busy. */
async function settled(page: Page): Promise<void> {
  await page.waitForLoadState('load');
  await expect(page.locator('[aria-busy="true"]')).toHaveCount(0, { timeout: 20_000 });
  await page.evaluate(() => document.fonts.ready);
}

for (const screen of SCREENS) {
  test(`${screen.name}: nothing for axe to find, no sideways scroll, pictures at both sizes`, async ({ page }) => {
    const known = await bandstandRoof();
    if (screen.as) await useSignIn(page, screen.as);
    if (screen.name.startsWith('field-') && screen.as) {
      await page.goto('/field');
      await expect(page.getByText('N12').first()).toBeVisible({ timeout: 20_000 });
    }
    for (const size of SIZES) {
      await page.setViewportSize(size);
      await page.goto(screen.path(known));
      await settled(page);
      await page.screenshot({ path: screenshotPath(`${screen.name}-${size.width}`), fullPage: true });
      const wider = await page.evaluate(
        () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
      );
      expect(wider, 'the page is wider than the screen').toBeLessThanOrEqual(0);
      const { violations } = await new AxeBuilder({ page }).analyze();
      expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' | ')}`)).toEqual([]);
    }
  });
}
