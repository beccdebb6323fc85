import 'server-only';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { fromBinary } from '@/lib/server/db/uuid-binary';
import { keptLetter } from '@/lib/server/mail/kept-letters';
import { type LetterBox, letterBox } from '@/lib/server/mail/letter-box';
import { selectRows } from './select-rows';
import { teamScope } from './team-scope';

/** A letter of the team. Instants are ISO 8601 UTC. */
export interface LetterAnswer {
  id: string;
  kind: string;
  recipient: string;
  writtenAt: string;
  sent: boolean;
  /** Its words; null where letters go out by mail, and then only their readers see them. */
  words: { subject: string; text: string } | null;
}

interface Row {
  id: Buffer;
  kind: string;
  recipient: string;
  writtenAt: Date;
  sentAt: Date | null;
}

/** Shown at once; older ones serve nobody. */
const MOST = 100;

/** The team's latest letters, newest first. In the demo they can be read here. */
export async function letters(ctx: TeamContext): Promise<{ letters: LetterAnswer[]; box: LetterBox }> {
  const box = await letterBox();
  const rows = await selectRows<Row>(
    teamScope(ctx),
    `SELECT id, kind, recipient, written_at AS writtenAt, sent_at AS sentAt FROM letters
     WHERE team_id = :team ORDER BY written_at DESC, id DESC LIMIT ${MOST}`,
  );
  const wordsOf = (id: string) => {
    const kept = box === 'kept' ? keptLetter(id) : null;
    return kept && { subject: kept.subject, text: kept.text };
  };
  const list = rows.map(({ id: bytes, kind, recipient, writtenAt, sentAt }) => {
    const id = fromBinary(bytes);
    const standing = { writtenAt: writtenAt.toISOString(), sent: sentAt !== null };
    return { id, kind, recipient, ...standing, words: wordsOf(id) };
  });
  return { letters: list, box };
}
