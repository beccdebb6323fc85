import { describe, expect, it } from 'vitest';
import { ROLES } from '@/lib/server/auth/role';
import { composeLetter } from '@/lib/server/mail/compose-letter';
import { invitationLetter, passwordChangedLetter, resetLetter } from '@/lib/server/mail/letter-words';

const TEAM = { name: 'Tarrow Trust', zone: 'America/New_York' };
const LINK = 'https://field.example/invitation/abc';
const UNTIL = Date.parse('2026-06-27T16:05:00Z');

const LETTERS = [
  ...ROLES.map((role) => invitationLetter({ team: TEAM, inviter: 'Imke', role, link: LINK, untilMs: UNTIL })),
  invitationLetter({ team: TEAM, inviter: null, role: 'coordinator', link: LINK, untilMs: UNTIL }),
  resetLetter({ team: TEAM, link: LINK, untilMs: UNTIL }),
  passwordChangedLetter({ team: TEAM, atMs: UNTIL, resetHref: LINK }),
];

describe('every letter', () => {
  it.each(LETTERS)('says the same in text and in HTML: $subject', ({ text, html }) => {
    const plain = html.replace(/<br>/g, ' ').replace(/<[^>]+>/g, '\n');
    for (const line of text.split('\n').filter((words) => words !== '' && !words.endsWith(':'))) {
      expect(plain).toContain(line);
    }
  });

  it.each(LETTERS)('tells its time in the team’s zone and signs with the team: $subject', ({ text }) => {
    expect(text).toContain('27 June 2026 at 12:05 (America/New_York)');
    expect(text.trimEnd().endsWith('Tarrow Trust')).toBe(true);
  });

  it.each(LETTERS)('makes no promise and no noise: $subject', ({ subject, text }) => {
    expect(`${subject}\n${text}`).not.toMatch(/harmless|\bsafe\b|guarante|saved|!|click here/i);
  });

  it.each(LETTERS)('fetches nothing when it is opened: $subject', ({ html }) => {
    expect(html).not.toMatch(/<img|<script|<link|url\(|src=/i);
  });
});

describe('a letter', () => {
  it('stays one letter whatever stands in a name', () => {
    const letter = composeLetter({
      subject: 'Ann\r\nBcc: x@evil.example',
      before: ['<img src=x onerror=alert(1)> & "Ann"'],
      link: { words: '<b>', href: 'https://field.example/?a="><script>' },
      after: [],
      team: '</body>',
    });
    expect(letter.subject).toBe('Ann Bcc: x@evil.example');
    expect(letter.html).toContain('&lt;img src=x onerror=alert(1)&gt; &amp; &quot;Ann&quot;');
    expect(letter.html).not.toMatch(/<img|<script|<b>/);
    expect(letter.html.match(/<\/body>/g)).toHaveLength(1);
  });
});
