import 'server-only';
import { demoSignIns } from '@/lib/server/auth/demo-sign-ins';
import { demoWanted, mailUrl } from '@/lib/server/env';

/** Where letters go: by mail, into the demo's own box, or nowhere because no mail is set up. */
export type LetterBox = 'mail' | 'kept' | 'none';

/**
 * Where letters go on this server. They are kept to be read in the browser only where the demo season with its
 * published passwords is loaded: in a team of real people a coordinator could take over accounts with them.
 */
export async function letterBox(): Promise<LetterBox> {
  if (mailUrl() !== null) return 'mail';
  return demoWanted() && (await demoSignIns()).length > 0 ? 'kept' : 'none';
}
