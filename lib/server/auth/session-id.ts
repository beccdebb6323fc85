import 'server-only';
import { isUuidText } from '@/lib/kit/uuid';

/** Where a session's row is: sessions are keyed by team and id. */
export interface SessionRef {
  teamId: string;
  sessionId: string;
}

/** The `sid` claim of a session token: `<team>.<session>`. */
export function formatSid({ teamId, sessionId }: SessionRef): string {
  return `${teamId}.${sessionId}`;
}

/** Reads a `sid` claim; null for anything else. */
export function parseSid(sid: unknown): SessionRef | null {
  if (typeof sid !== 'string') return null;
  const [teamId, sessionId, ...rest] = sid.split('.');
  return rest.length === 0 && isUuidText(teamId) && isUuidText(sessionId) ? { teamId, sessionId } : null;
}
