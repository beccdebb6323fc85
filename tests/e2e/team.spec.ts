import AxeBuilder from '@axe-core/playwright';
import { type Browser, type Page, expect, test } from '@playwright/test';
import { foundTeam } from '@/lib/server/commands/members/found-team';
import { createDemoDatabase } from '@/tests/support/demo-database';
import { press, tabTo, type } from '@/tests/support/pages/keyboard';
import { signInByForm } from '@/tests/support/pages/sign-in';
import { screenshotPath } from '@/tests/support/pages/screenshots';
import { type TestServer, startTestServer } from '@/tests/support/server';
import { WireClient } from '@/tests/support/wire/wire-client';

const FIRST_PASSWORD = 'eleven kestrels over gravel';
const SECOND_PASSWORD = 'tin roofs after the hail';
const COORDINATOR = 'coordinator@tarrow.example';

let server: TestServer;
let drop: () => Promise<void>;

test.describe.configure({ timeout: 400_000 });

test.beforeAll(async () => {
  const database = await createDemoDatabase();
  drop = database.drop;
  process.env.DB_NAME = database.name;
  server = await startTestServer({ database: database.name });
});

test.afterAll(async () => {
  await server.close();
  await globalThis.undereaveSequelize?.close();
  await drop();
});

async function pageOf(browser: Browser, size = { width: 1280, height: 800 }): Promise<Page> {
  const context = await browser.newContext({ baseURL: server.origin, viewport: size, hasTouch: false });
  return context.newPage();
}

async function expectNoViolations(page: Page): Promise<void> {
  const { violations } = await new AxeBuilder({ page }).analyze();
  expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' | ')}`)).toEqual([]);
}

/** Takes pictures at both sizes, with nothing for axe to find and no sideways scroll. */
async function look(page: Page, name: string): Promise<void> {
  const before = page.viewportSize() ?? { width: 1280, height: 800 };
  for (const size of [
    { width: 390, height: 844 },
    { width: 1280, height: 800 },
  ]) {
    await page.setViewportSize(size);
    await page.screenshot({ path: screenshotPath(`${name}-${size.width}`), fullPage: true });
    const wider = await page.evaluate(
      () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
    );
    expect(wider, `${name} at ${size.width} is wider than the screen`).toBeLessThanOrEqual(0);
    await expectNoViolations(page);
  }
  await page.setViewportSize(before);
}

/** The link of the newest letter to somebody, read in the demo's box. */
async function linkFor(coordinator: Page, email: string): Promise<string> {
  await coordinator.goto('/letters');
  const letter = coordinator.getByRole('listitem').filter({ hasText: email }).first();
  await letter.getByRole('group').locator('summary').click();
  const href = await letter.getByRole('link').first().getAttribute('href');
  return new URL(href ?? '').pathname;
}

async function signIn(page: Page, email: string, password: string): Promise<void> {
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password', { exact: true }).fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
}

test('a person is invited, joins, gets another role, is signed out, and chooses a new password', async ({
  browser,
}) => {
  const email = 'wren@tarrow.example';
  const coordinator = await pageOf(browser);
  await signInByForm(coordinator, COORDINATOR);
  await coordinator.goto('/members');
  await coordinator.getByLabel('E-mail').fill(email);
  await coordinator.getByLabel('Role').selectOption('reviewer');
  await coordinator.getByRole('button', { name: 'Invite', exact: true }).click();
  await expect(coordinator.getByText(/is among the letters of this demo/)).toBeVisible();
  await expect(coordinator.getByRole('row', { name: new RegExp(email) })).toContainText('reviewer');
  await look(coordinator, 'members');
  const link = await linkFor(coordinator, email);
  await look(coordinator, 'letters');

  const person = await pageOf(browser);
  await test.step('joins with a password of their own', async () => {
    await person.goto(link);
    await look(person, 'invitation');
    await person.getByLabel('Your name').fill('Wren Adeyemi');
    await person.getByLabel('Choose a password').fill('passwordpassword1');
    await person.getByRole('button', { name: /^Join/ }).click();
    await expect(person.getByText(/would be guessed early/)).toBeVisible();
    await person.getByLabel('Choose a password').fill(FIRST_PASSWORD);
    await person.getByRole('button', { name: /^Join/ }).click();
    await expect(person.getByRole('heading', { name: /You are a member/ })).toBeFocused();
    await person.goto(link);
    await expect(person.getByRole('heading', { name: 'This invitation does not work' })).toBeVisible();
    await look(person, 'invitation-closed');
    await signIn(person, email, FIRST_PASSWORD);
    await expect(person).toHaveURL(/\/nests$/);
  });

  await test.step('gets another role, which counts on the next page', async () => {
    await person.goto('/downloads');
    await expect(person.getByRole('heading', { name: 'Downloads' })).toBeVisible();
    await coordinator.goto('/members');
    await coordinator.getByRole('button', { name: 'Change Wren Adeyemi' }).click();
    const dialog = coordinator.getByRole('dialog');
    await coordinator.screenshot({ path: screenshotPath('member-dialog-1280') });
    await expectNoViolations(coordinator);
    await dialog.getByLabel('Role').selectOption('technician');
    await dialog.getByRole('button', { name: 'Give this role' }).click();
    await expect(dialog).toBeHidden();
    await expect(coordinator.getByRole('row', { name: /Wren Adeyemi/ })).toContainText('technician');
    await person.goto('/downloads');
    await expect(person).toHaveURL(/no-access/);
  });

  await test.step('is signed out everywhere', async () => {
    await coordinator.getByRole('button', { name: 'Change Wren Adeyemi' }).click();
    await coordinator.getByRole('dialog').getByRole('button', { name: 'Sign out everywhere' }).click();
    await expect(coordinator.getByRole('dialog')).toBeHidden();
    await person.goto('/nests');
    await expect(person).toHaveURL(/sign-in/);
  });

  await test.step('chooses a new password by letter', async () => {
    await person.getByRole('link', { name: 'Forgotten your password?' }).click();
    await look(person, 'reset-ask');
    await person.getByLabel('E-mail').fill(email);
    await person.getByRole('button', { name: 'Send me a link' }).click();
    await expect(person.getByText(/If .* belongs to an account/)).toBeVisible();
    const reset = await linkFor(coordinator, email);
    expect(reset).toMatch(/^\/reset\//);
    await person.goto(reset);
    await look(person, 'reset-set');
    await person.getByRole('textbox', { name: 'New password' }).fill(SECOND_PASSWORD);
    await person.getByRole('button', { name: 'Set the password' }).click();
    await expect(person.getByRole('heading', { name: 'The new password stands' })).toBeFocused();
    await signIn(person, email, FIRST_PASSWORD);
    await expect(person.getByText(/do not go together/)).toBeVisible();
    await signIn(person, email, SECOND_PASSWORD);
    await expect(person).toHaveURL(/\/field/);
    await person.goto('/account');
    await expect(person.getByText('here, now')).toBeVisible();
    await expect(person.getByText(/Chrome on/).first()).toBeVisible();
    await look(person, 'account');
  });

  await test.step('leaves, and is out at once', async () => {
    await person.getByRole('button', { name: /^Leave Tarrow/ }).click();
    await person.getByRole('dialog').getByRole('button', { name: 'Leave the team' }).click();
    await expect(person).toHaveURL(/sign-in/);
    await coordinator.goto('/members');
    const former = coordinator.getByRole('region', { name: 'Were in the team' });
    await expect(former).toContainText('Wren Adeyemi');
  });
});

test('a lost phone is withdrawn with a reason, and its next request refused', async ({ browser }) => {
  const phone = new WireClient(server.origin);
  await phone.signIn('technician2@tarrow.example');
  await phone.enrol('Phone in the marsh');
  const headers = { 'x-sync': '1', 'x-device': phone.device?.deviceId ?? '', 'x-unsent': '7' };
  expect((await phone.fetch('/api/sync/v1/pull', { headers })).status).toBe(200);

  const coordinator = await pageOf(browser);
  await signInByForm(coordinator, COORDINATOR);
  await coordinator.goto('/phones');
  await expect(coordinator.getByRole('row', { name: /Phone in the marsh/ })).toContainText('7 items');
  await look(coordinator, 'phones');
  await coordinator.getByRole('button', { name: /Withdraw .*Phone in the marsh/ }).click();
  await coordinator.getByLabel('Reason').fill('Lost in the marsh');
  await coordinator.screenshot({ path: screenshotPath('phone-dialog-1280') });
  await expectNoViolations(coordinator);
  await coordinator.getByRole('button', { name: 'Withdraw it' }).click();
  await expect(coordinator.getByText(/by Imke Dolan-Reyes: Lost in the marsh/)).toBeVisible();
  const refused = await phone.fetch('/api/sync/v1/pull', { headers });
  expect([refused.status, await refused.text()]).toEqual([403, expect.stringContaining('device-revoked')]);
  await coordinator.screenshot({ path: screenshotPath('phones-withdrawn-1280'), fullPage: true });
});

test('an empty team comes to its first dates by keyboard alone, at phone size', async ({ browser }) => {
  const size = { width: 390, height: 844 };
  const { link } = await foundTeam(
    { name: 'Wexcombe Eaves Group', zone: 'America/New_York', email: 'lead@wexcombe.example' },
    Date.now(),
  );
  const lead = await pageOf(browser, size);
  await test.step('its first coordinator joins and is led to the first step', async () => {
    await lead.goto(new URL(link).pathname);
    await type(lead, lead.getByLabel('Your name'), 'Ottoline Fry');
    await type(lead, lead.getByLabel('Choose a password'), FIRST_PASSWORD);
    await lead.keyboard.press('Enter');
    await press(lead, lead.getByRole('link', { name: 'To the sign-in' }));
    await type(lead, lead.getByLabel('E-mail'), 'lead@wexcombe.example');
    await type(lead, lead.getByLabel('Password', { exact: true }), FIRST_PASSWORD);
    await lead.keyboard.press('Enter');
    await expect(lead).toHaveURL(/\/start$/, { timeout: 20_000 });
    await expect(lead.locator('[aria-current="step"]')).toContainText('Invite a technician');
    await look(lead, 'start-empty');
  });

  await test.step('invites a technician', async () => {
    await press(lead, lead.getByRole('link', { name: 'Invite somebody' }));
    await type(lead, lead.getByLabel('E-mail'), 'tech@wexcombe.example');
    await lead.keyboard.press('Enter');
    await expect(lead.getByText(/is among the letters of this demo/)).toBeVisible();
    await lead.goto('/start');
    await expect(lead.getByText(/waiting for an answer: 1 invitation/)).toBeVisible();
  });

  const tech = await pageOf(browser, size);
  await test.step('the technician joins, and the phone enrols by itself', async () => {
    await tech.goto(await linkFor(lead, 'tech@wexcombe.example'));
    await type(tech, tech.getByLabel('Your name'), 'Isidor Pell');
    await type(tech, tech.getByLabel('Choose a password'), FIRST_PASSWORD);
    await tech.keyboard.press('Enter');
    await press(tech, tech.getByRole('link', { name: 'To the sign-in' }));
    await type(tech, tech.getByLabel('E-mail'), 'tech@wexcombe.example');
    await type(tech, tech.getByLabel('Password', { exact: true }), FIRST_PASSWORD);
    await tech.keyboard.press('Enter');
    await expect(tech).toHaveURL(/\/field/, { timeout: 20_000 });
  });

  await test.step('opens a nest and reads her comb', async () => {
    await press(tech, tech.getByRole('link', { name: 'Start a nest' }).first());
    await type(tech, tech.getByLabel('Code'), 'W01');
    await press(tech, tech.getByRole('button', { name: 'Start the nest' }));
    await press(tech, tech.getByRole('link', { name: 'Start a visit' }));
    await press(tech, tech.getByRole('button', { name: 'Start the visit' }));
    await press(tech, tech.getByRole('button', { name: 'Start reading' }));
    await type(tech, tech.getByRole('dialog').getByRole('textbox'), '5');
    await press(tech, tech.getByRole('button', { name: 'Read the cells' }));
    await expect(tech.getByRole('group', { name: 'Keys' })).toBeVisible();
    await tech.keyboard.type('cclse', { delay: 150 });
    await press(tech, tech.getByRole('button', { name: 'Finish' }));
    await press(tech, tech.getByRole('button', { name: 'Submit reading' }));
    await expect(tech.getByText(/at the office/i).first()).toBeVisible({ timeout: 60_000 });
  });

  await test.step('the coordinator sees the dates', async () => {
    await lead.goto('/start');
    await expect(lead.locator('[aria-current="step"]')).toHaveCount(0);
    await look(lead, 'start-done');
    await press(lead, lead.getByRole('link', { name: 'Open W01' }));
    await expect(lead.getByText(/between .* and /).first()).toBeVisible();
    await tabTo(lead, lead.getByText('What is this page?'));
    await lead.keyboard.press('Enter');
    await expect(lead.getByText(/One nest: her comb from below/)).toBeVisible();
    await look(lead, 'nest-with-help');
  });
});
