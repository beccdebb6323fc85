import 'server-only';
import type { Role } from '@/lib/server/auth/role';
import { type ComposedLetter, composeLetter } from './compose-letter';

/** Who writes, and in which time zone times are told. */
export interface LetterTeam {
  name: string;
  zone: string;
}

const ROLE_LINES: Readonly<Record<Role, string>> = {
  technician: 'as a technician: you read combs at the nest with a phone, also where there is no signal',
  reviewer: 'as a reviewer: you read combs a second time, settle where the two readings differ, and lock the result',
  biologist: 'as lead biologist: you own the settings behind every estimate, and settle what others cannot',
  coordinator: 'as coordinator: you look after people, hosts, phones and downloads',
  researcher: 'as researcher: you download the data, with places rounded',
};

/** A moment in words: `8 December 2026 at 14:05 (America/New_York)`. */
function moment(epochMs: number, zone: string): string {
  const form = new Intl.DateTimeFormat('en-GB', {
    dateStyle: 'long',
    timeStyle: 'short',
    timeZone: zone,
  });
  return `${form.format(epochMs)} (${zone})`;
}

/** What an invitation says. */
export interface InvitationWords {
  team: LetterTeam;
  /** Null when the person at the machine invites a team's first coordinator. */
  inviter: string | null;
  role: Role;
  link: string;
  untilMs: number;
}

/** Asks somebody into a team. */
export function invitationLetter({ team, inviter, role, link, untilMs }: InvitationWords): ComposedLetter {
  return composeLetter({
    subject: `${inviter ?? team.name} asks you to join ${inviter ? team.name : 'as its coordinator'}`,
    before: [
      'Hello,',
      `${inviter ?? 'Whoever set this team up'} asks you to join ${team.name} ${ROLE_LINES[role]}. The team moves nests of native paper wasps instead of destroying them, and keeps its records in Undereave.`,
      `The link below works once, until ${moment(untilMs, team.zone)}. Behind it you give your name and choose a password. If you have an account already, it adds the team to that account.`,
    ],
    link: { words: 'Join the team', href: link },
    after: [
      'Keep the link to yourself: whoever opens it first joins in your place.',
      'If you did not expect this letter, leave it. Without the link nothing happens.',
    ],
    team: team.name,
  });
}

/** What a letter about a forgotten password says. */
export interface ResetWords {
  team: LetterTeam;
  link: string;
  untilMs: number;
}

/** Lets somebody choose a new password. */
export function resetLetter({ team, link, untilMs }: ResetWords): ComposedLetter {
  return composeLetter({
    subject: 'Choose a new password for Undereave',
    before: [
      'Hello,',
      'A new password was asked for with this e-mail address.',
      `The link below works once, until ${moment(untilMs, team.zone)}. When the new password stands, you are signed out on every phone and computer. What a phone has not sent stays on it and goes once you have signed in again.`,
    ],
    link: { words: 'Choose a new password', href: link },
    after: ['If it was not you, leave this letter. Your password stays as it is.'],
    team: team.name,
  });
}

/** What the notice of a changed password says. */
export interface PasswordChangedWords {
  team: LetterTeam;
  atMs: number;
  /** Where to ask for a new password. */
  resetHref: string;
}

/** Tells the owner that the password is another one now. */
export function passwordChangedLetter({ team, atMs, resetHref }: PasswordChangedWords): ComposedLetter {
  return composeLetter({
    subject: 'Your password for Undereave was changed',
    before: [
      'Hello,',
      `The password of your account was changed on ${moment(atMs, team.zone)}. Your other sign-ins were ended.`,
      'If that was you, there is nothing to do. If it was not, choose a new password now and tell your coordinator.',
    ],
    link: { words: 'It was not me: ask for a new password', href: resetHref },
    after: [],
    team: team.name,
  });
}
