import { type Page, expect } from '@playwright/test';
import { origin } from '@/tests/support/running-server';
import { DEMO_PASSWORD, WireClient } from '@/tests/support/wire/wire-client';

/** Signs a person in through the form, as they would. */
export async function signInByForm(page: Page, email: string): Promise<void> {
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password', { exact: true }).fill(DEMO_PASSWORD);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await expect(page).not.toHaveURL(/sign-in/, { timeout: 20_000 });
}

const signedIn = new Map<string, Promise<WireClient>>();

async function signInOverTheWire(email: string): Promise<WireClient> {
  const client = new WireClient(origin());
  expect(await client.signIn(email)).toBe(200);
  return client;
}

/** A person signed in once for all tests of this worker; not for tests that sign out or end sessions. */
export function signedInPerson(email: string): Promise<WireClient> {
  const known = signedIn.get(email) ?? signInOverTheWire(email);
  signedIn.set(email, known);
  return known;
}

/** Gives a page that person's sign-in without going through the form. */
export async function useSignIn(page: Page, email: string): Promise<void> {
  const { jar } = await signedInPerson(email);
  await page.context().addCookies(jar.all().map((cookie) => ({ ...cookie, url: origin() })));
}
