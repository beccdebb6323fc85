import 'server-only';
import type { Role } from '@/lib/server/auth/role';

/** An invented person who can sign in to the demo. */
export interface Person {
  email: string;
  name: string;
  role: Role;
}

/** The one password of every demo sign-in. */
export const DEMO_PASSWORD = 'seven-quiet-ladders-2026';
