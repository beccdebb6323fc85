import { redirect } from 'next/navigation';
import { currentSession } from '@/lib/server/auth/current-session';

export const dynamic = 'force-dynamic';

/** The front door: technicians to the phone app, everybody else to the nests, strangers to the sign-in. */
export default async function StartPage(): Promise<never> {
  const session = await currentSession();
  if (!session) redirect('/sign-in');
  redirect(session.role === 'technician' ? '/field' : '/nests');
}
