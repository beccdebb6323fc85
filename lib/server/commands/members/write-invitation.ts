import 'server-only';
import type { Transaction } from 'sequelize';
import type { Role } from '@/lib/server/auth/role';
import { newSecretLink } from '@/lib/server/auth/secret-link';
import { publicUrl } from '@/lib/server/env';
import { invitationLetter } from '@/lib/server/mail/letter-words';
import { type NotedLetter, noteLetter } from '@/lib/server/mail/send-letter';

/** An invitation can be answered for this long. */
const INVITATION_MS = 7 * 24 * 60 * 60_000;

/** The link of an invitation as it is stored, and its letter as it can be read. */
export interface FreshLink {
  hash: Buffer;
  expiresAt: Date;
  /** The address a person opens. */
  href: string;
}

/** A new link for an invitation; the one before stops working when its hash is overwritten. */
export function freshLink(nowMs: number): FreshLink {
  const { token, hash } = newSecretLink();
  return { hash, expiresAt: new Date(nowMs + INVITATION_MS), href: `${publicUrl()}/invitation/${token}` };
}

/** Who is asked, by whom, as what. */
export interface InvitationNote {
  team: { id: string; name: string; zone: string };
  inviter: string | null;
  invitationId: string;
  email: string;
  role: Role;
  link: FreshLink;
  nowMs: number;
}

/** Writes the letter of an invitation and notes that it is to go out. */
export async function noteInvitation(note: InvitationNote, transaction: Transaction): Promise<NotedLetter> {
  const { team, inviter, role, link } = note;
  const letter = invitationLetter({ team, inviter, role, link: link.href, untilMs: link.expiresAt.getTime() });
  return noteLetter(
    {
      teamId: team.id,
      recipient: note.email,
      letter,
      kind: 'invitation',
      subjectId: note.invitationId,
      nowMs: note.nowMs,
    },
    transaction,
  );
}
