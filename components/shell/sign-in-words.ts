import { countWords } from '@/components/ui/date-words';
import type { SignInResult } from './sign-in-request';

/** What to tell the person when a sign-in did not work; null when it did. */
export function signInTrouble(result: SignInResult | null): string | null {
  switch (result?.kind) {
    case 'wrong':
      return 'This e-mail and password do not go together. Check both and try again.';
    case 'wait':
      return `Too many attempts. Wait ${countWords(result.seconds, 'second')}, then try again.`;
    case 'unreachable':
      return 'The office cannot be reached. Check the network and try again. Nothing on your phone is lost.';
    case 'failed':
      return 'Something failed on our side. Try again in a moment.';
    default:
      return null;
  }
}
