import 'server-only';
import { COMMON_WORDS } from './common-words';
import { isPasswordLength } from './password';

/** What a new password must not be made of, beside the common words. */
export interface PasswordOwner {
  email: string;
  /** The person's name, as far as it is known. */
  name: string;
  teams: readonly string[];
}

/** What is wrong with a new password. */
export type PasswordFault = 'password-length' | 'common';

/** Letters of its own a password needs once everything easy to guess is taken out of it. */
const OWN_LETTERS = 8;
const OWN_DISTINCT = 4;

/** Parts of names shorter than this are left in: they turn up in other words. */
const SHORTEST_PART = 3;

/** Rows that fingers run along, either way. */
const ROWS = [
  'abcdefghijklmnopqrstuvwxyz',
  'qwertyuiopasdfghjklzxcvbnm',
  'qwertzuiop',
  'azertyuiop',
  'qazwsxedcrfvtgb',
];
const SHORTEST_RUN = 4;

const PRODUCT = 'undereave';

/** Figures and signs that stand for letters; a 1 stands for two. */
const STANDS_FOR: Readonly<Record<string, string>> = {
  '0': 'o',
  '3': 'e',
  '4': 'a',
  '5': 's',
  '7': 't',
  '8': 'b',
  '@': 'a',
  $: 's',
  '!': 'i',
};

function reversed(text: string): string {
  return [...text].reverse().join('');
}

function piecesOf(row: string): string[] {
  return Array.from({ length: row.length - SHORTEST_RUN + 1 }, (_, at) => row.slice(at, at + SHORTEST_RUN));
}

/** Every piece of a row, either way; longer runs are made of these. */
const RUNS = ROWS.flatMap((row) => [...piecesOf(row), ...piecesOf(reversed(row))]);

/** What is tried first, whoever the password is for. */
const TRIED_FIRST: readonly string[] = [...COMMON_WORDS, ...RUNS];

/** The text without figures, spaces and signs; letters of every script and emoji stay. */
function lettersOf(text: string): string {
  return text.replace(/[\p{N}\p{P}\p{Z}\p{Sc}\p{Sk}\p{Sm}]/gu, '');
}

/** The ways a password may be meant: as typed, and with the figures read as letters. */
function readings(password: string): string[] {
  const plain = password.normalize('NFKC').toLowerCase();
  const spelled = (one: string) => [...plain].map((sign) => (sign === '1' ? one : (STANDS_FOR[sign] ?? sign))).join('');
  return [...new Set([plain, spelled('i'), spelled('l')].map(lettersOf))];
}

/** `abcabc` → `abc`; any other text as it is. */
function withoutRepeats(text: string): string {
  const again = `${text}${text}`.indexOf(text, 1);
  return again > 0 && again < text.length ? text.slice(0, again) : text;
}

function partsOf(text: string): string[] {
  return text
    .toLowerCase()
    .split(/[^\p{L}]+/u)
    .filter((part) => part.length >= SHORTEST_PART);
}

/** What is left of a text when every place that belongs to one of these words is taken out of it. */
function without(text: string, words: ReadonlySet<string>): string {
  const longest = Math.max(...[...words].map((word) => word.length));
  const covered = new Set<number>();
  for (let from = 0; from < text.length; from++) {
    for (let to = from + SHORTEST_PART; to <= Math.min(text.length, from + longest); to++) {
      if (words.has(text.slice(from, to))) for (let at = from; at < to; at++) covered.add(at);
    }
  }
  return text
    .split('')
    .filter((_, at) => !covered.has(at))
    .join('');
}

function isGuessable(text: string, words: ReadonlySet<string>): boolean {
  const own = withoutRepeats(without(text, words));
  return [...own].length < OWN_LETTERS || new Set(own).size < OWN_DISTINCT;
}

/** Names that may not stand in a password at all: the product's, each team's, and the e-mail address. */
function forbiddenNames({ email, teams }: PasswordOwner): string[] {
  const names = [PRODUCT, ...teams, email, email.split('@', 1)[0] ?? ''].map((name) => lettersOf(name.toLowerCase()));
  return names.filter((name) => name.length > SHORTEST_PART + 2);
}

/**
 * May this become the person's password? Long enough, not too long to be hashed, and not made of what is tried first:
 * common words, runs of keys, the product's, the team's and the person's own names. What kinds of signs it has does
 * not matter (NIST SP 800-63B-4).
 *
 * @returns what is wrong, or null.
 */
export function passwordFault(password: string, owner: PasswordOwner): PasswordFault | null {
  if (!isPasswordLength(password)) return 'password-length';
  const about = [owner.email, owner.name, ...owner.teams].flatMap(partsOf);
  const words = new Set([...TRIED_FIRST, ...about]);
  const names = forbiddenNames(owner);
  const texts = readings(password);
  const isCommon = texts.some((text) => isGuessable(text, words) || names.some((name) => text.includes(name)));
  return isCommon ? 'common' : null;
}
