import { notFound } from 'next/navigation';
import { stringMember } from '@/components/shell/string-member';

/** The stable code of what a query threw (`not-found`, `blind`, …); null for any other fault. */
export function problemCode(thrown: unknown): string | null {
  return thrown instanceof Error ? stringMember(thrown, 'code') : null;
}

/** What a query answers, or the not-found page when the team has no such thing. */
export async function foundOrAway<T>(answer: Promise<T>): Promise<T> {
  try {
    return await answer;
  } catch (thrown) {
    if (problemCode(thrown) === 'not-found') notFound();
    throw thrown;
  }
}
