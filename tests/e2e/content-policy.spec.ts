import { type Page, expect, test } from '@playwright/test';
import { signInByForm } from '@/tests/support/pages/sign-in';

interface Breach {
  directive: string;
  what: string;
}

/** Collects what the browser blocks, on every document of the page. */
async function watchPolicy(page: Page): Promise<Breach[]> {
  const breaches: Breach[] = [];
  await page.exposeFunction('reportBreach', (breach: Breach) => breaches.push(breach));
  await page.addInitScript(() => {
    document.addEventListener('securitypolicyviolation', (event) => {
      const target = event.target instanceof Element ? event.target.outerHTML.slice(0, 200) : '';
      const report = (globalThis as unknown as { reportBreach(breach: Breach): void }).reportBreach;
      report({ directive: event.effectiveDirective, what: `${event.blockedURI} ${event.sample} ${target}` });
    });
  });
  return breaches;
}

test('a walk through the lab by its own links breaks no content policy', async ({ page }) => {
  await page.setViewportSize({ width: 1280, height: 800 });
  const breaches = await watchPolicy(page);
  await signInByForm(page, 'reviewer@tarrow.example');
  await page
    .getByRole('link', { name: /N12|Fennel Green/ })
    .first()
    .click();
  await expect(page.getByRole('heading', { level: 1 })).toContainText('Fennel Green');
  await page.getByRole('link', { name: 'Open at the bench' }).first().click();
  await expect(page).toHaveURL(/readings/);
  for (const name of ['Hosts', 'Downloads', 'Nests']) {
    const link = page.getByRole('navigation').getByRole('link', { name, exact: true });
    await link.click();
    await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
    await expect(link).toHaveAttribute('aria-current', 'page');
  }
  await page.goBack();
  await page.goForward();
  expect(breaches).toEqual([]);
});

test('the watch itself sees a breach', async ({ page }) => {
  const breaches = await watchPolicy(page);
  await page.goto('/sign-in');
  await page.evaluate(() => document.body.setAttribute('style', 'color: red'));
  await expect.poll(() => breaches.length).toBeGreaterThan(0);
  expect(breaches[0]?.directive).toBe('style-src-attr');
});
