import { type Page, expect } from '@playwright/test';
import { DEMO_PASSWORD } from '@/tests/support/wire/wire-client';

/** Signs a person in through the form, as they would. */
export async function signInByForm(page: Page, email: string): Promise<void> {
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password', { exact: true }).fill(DEMO_PASSWORD);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await expect(page).not.toHaveURL(/sign-in/, { timeout: 20_000 });
}
