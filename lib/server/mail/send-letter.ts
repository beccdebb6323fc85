import 'server-only';
import type { Transaction } from 'sequelize';
import { systemClock } from '@/lib/kit/system-clock';
import { database } from '@/lib/server/db/database';
import { newId } from '@/lib/server/db/new-id';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { mailFrom, mailUrl } from '@/lib/server/env';
import { log } from '@/lib/server/log/log';
import type { ComposedLetter } from './compose-letter';
import { keepLetter } from './kept-letters';
import { letterBox } from './letter-box';

/** A letter about to go out. Written down in the transaction of what it tells; its words never reach the database. */
export interface NotedLetter {
  teamId: string;
  id: string;
  recipient: string;
  letter: ComposedLetter;
}

/** What to write down of a letter. */
export interface LetterNote extends Omit<NotedLetter, 'id'> {
  kind: 'invitation' | 'reset' | 'password-changed';
  /** The invitation or person it is about. */
  subjectId: string;
  nowMs: number;
}

/** What became of a letter. `failed` letters are written anew by the act that wrote them. */
export type LetterStanding = 'sent' | 'kept' | 'failed';

/** Longest wait for a mail server, in milliseconds: the person at the page waits too. */
const PATIENCE_MS = 10_000;

/** Loaded when needed: most requests write no letter. */
const nodemailer = () => import('nodemailer');

/** Writes down that a letter is to go out, so that one lost between the commit and the mail server is seen as not sent. */
export async function noteLetter(note: LetterNote, transaction: Transaction): Promise<NotedLetter> {
  const { teamId, recipient, letter, kind, subjectId, nowMs } = note;
  const id = newId();
  await database().models.Letter.create(
    {
      team_id: toBinary(teamId),
      id: toBinary(id),
      kind,
      recipient,
      subject_id: toBinary(subjectId),
      written_at: new Date(nowMs),
      sent_at: null,
      failure: null,
    },
    { transaction },
  );
  return { teamId, id, recipient, letter };
}

async function post({ recipient, letter }: NotedLetter): Promise<void> {
  const { createTransport } = await nodemailer();
  const timeouts = { connectionTimeout: PATIENCE_MS, greetingTimeout: PATIENCE_MS, socketTimeout: PATIENCE_MS };
  const transport = createTransport({ url: mailUrl() ?? '', ...timeouts });
  try {
    await transport.sendMail({
      from: mailFrom(),
      // As an object: text would be read as a list of addresses.
      to: { name: '', address: recipient },
      ...letter,
      disableFileAccess: true,
      disableUrlAccess: true,
    });
  } finally {
    transport.close();
  }
}

/** Hands a letter to the mail server, or to the demo's box; a word for what failed, or null. */
async function deliver(noted: NotedLetter): Promise<string | null> {
  const box = await letterBox();
  if (box === 'none') return 'no-mail';
  try {
    if (box === 'kept') keepLetter(noted.id, noted.letter);
    else await post(noted);
    return null;
  } catch (error) {
    // The server's own words may quote the address, so only its code is kept.
    const code: unknown = error instanceof Error ? Reflect.get(error, 'code') : null;
    log({ event: 'letter-failed', code: typeof code === 'string' ? code : null });
    return 'not-taken';
  }
}

/** Sends a letter after its transaction has been committed, and writes down what became of it. Never throws for mail. */
export async function sendLetter(noted: NotedLetter): Promise<LetterStanding> {
  const failure = await deliver(noted);
  const sent_at = failure === null ? new Date(systemClock.now()) : null;
  const where = { team_id: toBinary(noted.teamId), id: toBinary(noted.id) };
  await database().models.Letter.update({ sent_at, failure }, { where });
  if (failure !== null) return 'failed';
  return mailUrl() === null ? 'kept' : 'sent';
}
