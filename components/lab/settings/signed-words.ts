import { momentWords } from '@/components/ui/date-words';
import type { SignedView } from './settings-shapes';

/** Which version, who signed it and when, in one line. */
export function signedWords({ version, signedBy, signedAt }: SignedView, zone: string): string {
  if (version === 0) return 'The product’s defaults. Nothing has been signed yet.';
  const when = signedAt ? `, ${momentWords(signedAt, zone, '')}` : '';
  return `Version ${version}, ${signedBy ? `signed by ${signedBy}` : 'set up with the team'}${when}`;
}
