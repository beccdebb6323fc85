import 'server-only';
import { z } from 'zod';
import { isCleanText } from '@/lib/protocol/check-text';
import { MAX_TEXT } from '@/lib/protocol/limits';

function isReason(text: string): boolean {
  return text.trim() !== '' && [...text].length <= MAX_TEXT && isCleanText(text);
}

/** Why somebody decided: words, at most `MAX_TEXT` code points, kept as written. */
export const DECISION_REASON = z.string().refine(isReason);
