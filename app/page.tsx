import { redirect } from 'next/navigation';
import { currentSession } from '@/lib/server/auth/current-session';
import { hasNest } from '@/lib/server/auth/has-nest';

export const dynamic = 'force-dynamic';

/**
 * The front door: technicians to the phone app, a team without a nest to its first steps, everybody else to the nests,
 * strangers to the sign-in.
 */
export default async function StartPage(): Promise<never> {
  const session = await currentSession();
  if (!session) redirect('/sign-in');
  if (session.role === 'technician') redirect('/field');
  redirect((await hasNest(session)) ? '/nests' : '/start');
}
