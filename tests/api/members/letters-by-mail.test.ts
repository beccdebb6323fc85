import { afterAll, beforeAll, expect, it } from 'vitest';
import { PASSWORD, makeAccount } from '@/tests/support/auth/account';
import { makeTeam } from '@/tests/support/factories/make-team';
import { type TestMailServer, startMailServer, tokenIn, unquoted } from '@/tests/support/members/letters';
import { type TestServer, startTestServer } from '@/tests/support/server';
import { WireClient } from '@/tests/support/wire/wire-client';

let mail: TestMailServer;
let server: TestServer;

beforeAll(async () => {
  mail = await startMailServer();
  server = await startTestServer({ database: process.env.DB_NAME ?? '', env: { MAIL_URL: mail.url } });
}, 120_000);

afterAll(async () => {
  await server.close();
  await mail.close();
});

it('the built application hands letters to the mail server, with a link to itself', async () => {
  const team = await makeTeam();
  const { email } = await makeAccount(team.teamId, 'coordinator');
  const coordinator = new WireClient(server.origin);
  expect(await coordinator.signIn(email, PASSWORD)).toBe(200);
  const response = await coordinator.post('/api/invitations', { email: 'new@test.example', role: 'technician' });
  expect([response.status, await response.json()]).toEqual([200, expect.objectContaining({ letter: 'sent' })]);
  const letter = unquoted(mail.received[0] ?? '');
  expect(letter).toContain('To: new@test.example');
  expect(letter).toContain('From: Undereave <no-reply@127.0.0.1>');
  expect(letter).toContain(`${server.origin}/invitation/${tokenIn(mail, 'invitation')}`);
  // Where letters go out by mail, nobody but their reader sees their words.
  const page = await (await coordinator.fetch('/letters')).text();
  expect(page).toContain('new@test.example');
  expect(page).not.toContain(tokenIn(mail, 'invitation'));
});
