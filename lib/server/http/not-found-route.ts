import 'server-only';
import { newId } from '@/lib/server/db/new-id';
import { problemResponse } from './problem';

/** Answers an address that does not exist, whatever the method; it tells nothing about who is signed in. */
export async function notFoundRoute(): Promise<Response> {
  return problemResponse('not-found', newId());
}
