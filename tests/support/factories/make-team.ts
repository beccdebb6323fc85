import { v7 } from 'uuid';
import { ROLES, type Role } from '@/lib/server/auth/role';
import { SESSION_SECONDS, sessionSetCookie } from '@/lib/server/auth/session-cookie';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { systemClock } from '@/lib/kit/system-clock';

/** A signed-in member of a test team. */
export interface TestMember {
  userId: string;
  name: string;
  role: Role;
  /** `Cookie` header of the member's session. */
  cookie: string;
}

/** A team with one signed-in member of every role, and a second technician and reviewer. */
export interface TestTeam {
  teamId: string;
  name: string;
  members: Record<Role | 'technician2' | 'reviewer2', TestMember>;
}

/** What a test says about its team. */
export interface TeamInput {
  name?: string;
  zone?: string;
  /** Put into every person's name and e-mail, to be looked for where it must not turn up. */
  canary?: string;
}

async function makeMember(teamId: string, role: Role, name: string): Promise<TestMember> {
  const { User, Membership } = database().models;
  const userId = v7();
  await User.create({
    id: toBinary(userId),
    email: `${userId}@test.example`,
    display_name: name,
    password_hash: 'not a hash: nobody signs in with it',
    disabled_at: null,
  });
  await Membership.create({ team_id: toBinary(teamId), user_id: toBinary(userId), role });
  return { userId, name, role, cookie: await signIn(teamId, userId) };
}

/** Signs a member in and returns the `Cookie` header of the new session. */
export async function signIn(teamId: string, userId: string): Promise<string> {
  const sessionId = v7();
  const now = systemClock.now();
  await database().models.Session.create({
    team_id: toBinary(teamId),
    id: toBinary(sessionId),
    user_id: toBinary(userId),
    created_at: new Date(now),
    last_seen_at: new Date(now),
    expires_at: new Date(now + SESSION_SECONDS * 1000),
    revoked_at: null,
  });
  const line = await sessionSetCookie({ userId, teamId, sessionId });
  return line.split(';', 1)[0] ?? '';
}

/** Makes a team with its counter row and its members. */
export async function makeTeam({
  name = 'Tarrow Trust',
  zone = 'America/New_York',
  canary = '',
}: TeamInput = {}): Promise<TestTeam> {
  const { Team, TeamCounter } = database().models;
  const teamId = v7();
  const id = toBinary(teamId);
  await Team.create({ id, name, zone, home_lat: 43.6, home_lon: -77.6 });
  await TeamCounter.create({ team_id: id, seq: 0, safe_seq: 0, audit_seq: 0, audit_hash: Buffer.alloc(32) });
  const make = (role: Role, person: string) => makeMember(teamId, role, `${person}${canary}`);
  const named: [Role, string][] = ROLES.map((role) => [role, `The ${role}`]);
  const members = await Promise.all(named.map(([role, person]) => make(role, person)));
  const byRole = (role: Role) => members.find((member) => member.role === role) ?? members[0];
  const [technician, reviewer, biologist, coordinator, researcher] = ROLES.map(byRole);
  if (!technician || !reviewer || !biologist || !coordinator || !researcher) throw new Error('a role has no member');
  const others = {
    technician2: await make('technician', 'Another technician'),
    reviewer2: await make('reviewer', 'Another reviewer'),
  };
  return { teamId, name, members: { technician, reviewer, biologist, coordinator, researcher, ...others } };
}
