import { countWords } from '@/components/ui/date-words';

/** An enrolled phone, as the page is given it. Instants are ISO 8601 UTC. */
export interface PhoneView {
  id: string;
  label: string;
  person: string;
  own: boolean;
  enrolledAt: string;
  lastSeenAt: string;
  /** Null when the phone never said. */
  unsent: number | null;
  revoked: { at: string; by: string; reason: string } | null;
}

/** A phone as a person would point at it. */
export function phoneName({ label, person, own }: PhoneView): string {
  return own ? `your ${label}` : `${person}’s ${label}`;
}

/** How much a phone held when it was last seen. */
export function unsentWords(unsent: number | null): string {
  if (unsent === null) return 'not said';
  return unsent === 0 ? 'nothing' : countWords(unsent, 'item');
}

/** What is lost with a phone, as far as the office can know. */
export function unsentWarning(unsent: number | null): string {
  if (unsent === null) return 'It never said whether it holds anything that was not sent.';
  if (unsent === 0) return 'When last seen, it had sent everything. What was recorded on it since is not here.';
  return `When last seen, it held ${countWords(unsent, 'item')} that are not at the office. If you have it in your hand, send them or copy them first.`;
}
