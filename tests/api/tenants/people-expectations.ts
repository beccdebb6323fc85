import { v7 } from 'uuid';
import { ROLES, type Role } from '@/lib/server/auth/role';
import { newSecretLink } from '@/lib/server/auth/secret-link';
import { database } from '@/lib/server/db/database';
import { fromBinary, toBinary } from '@/lib/server/db/uuid-binary';
import { makeAccount } from '@/tests/support/auth/account';
import { makeInvitation } from '@/tests/support/members/make-invitation';
import type { ApiCall } from '@/tests/support/factories/call-api';
import type { Asker, MethodExpectation, RouteExpectation } from './expectation';

const COORDINATOR: readonly Role[] = ['coordinator'];
const HAVE_PHONES: readonly Role[] = ['technician', 'reviewer', 'biologist', 'coordinator'];
const UNKNOWN = '01890000-0000-7000-8000-00000000dead';

function about(id: string, body: object = {}): ApiCall {
  return { params: { id }, body };
}

/** An act on a member of the team, who is made for the occasion. */
function onMember(body: object): MethodExpectation {
  return {
    may: COORDINATOR,
    own: async ({ tenant }) => [
      { name: 'a member', call: about((await makeAccount(tenant.team.teamId)).userId, body), status: 200 },
      { name: 'malformed id', call: about("' OR 1=1--", body), status: 404 },
      { name: 'unknown member of the body', call: about(UNKNOWN, { ...body, teamId: v7() }), status: 400 },
    ],
    pairs: ({ other }) => [
      {
        name: 'person',
        foreign: about(other.team.members.technician.userId, body),
        unknown: about(UNKNOWN, body),
        status: 404,
      },
    ],
  };
}

const onInvitation: MethodExpectation = {
  may: COORDINATOR,
  own: async ({ tenant }) => [
    { name: 'an invitation', call: about(await makeInvitation(tenant.team.teamId)), status: 200 },
    { name: 'malformed id', call: about('..'), status: 404 },
  ],
  pairs: ({ other }) => [
    { name: 'invitation', foreign: about(other.invitation), unknown: about(UNKNOWN), status: 404 },
  ],
};

async function makePhone({ tenant, member }: Asker): Promise<string> {
  const id = v7();
  const at = new Date(0);
  const own = { team_id: toBinary(tenant.team.teamId), id: toBinary(id), user_id: toBinary(member.userId) };
  const times = { enrolled_at: at, last_seen_at: at, revoked_at: null };
  await database().models.Device.create({ ...own, ...times, label: 'Phone', device_key: Buffer.alloc(32) });
  return id;
}

async function sessionOf(userId: string): Promise<string> {
  const where = { user_id: toBinary(userId) };
  return fromBinary((await database().models.Session.findOne({ where, rejectOnEmpty: true })).id);
}

/** What the routes about people, invitations, accounts and phones do for whom. */
export const PEOPLE_EXPECTATIONS: Readonly<Record<string, RouteExpectation>> = {
  'invitations/route.ts': {
    load: () => import('@/app/api/invitations/route'),
    methods: {
      POST: {
        may: COORDINATOR,
        own: () => [
          { name: 'somebody', call: { body: { email: `${v7()}@test.example`, role: 'reviewer' } }, status: 200 },
          { name: 'no address', call: { body: { email: 'a b', role: 'reviewer' } }, status: 400 },
          { name: 'no role', call: { body: { email: 'a@b.example', role: 'owner' } }, status: 400 },
        ],
      },
    },
  },
  'invitations/[id]/renew/route.ts': {
    load: () => import('@/app/api/invitations/[id]/renew/route'),
    methods: { POST: onInvitation },
  },
  'invitations/[id]/withdraw/route.ts': {
    load: () => import('@/app/api/invitations/[id]/withdraw/route'),
    methods: { POST: onInvitation },
  },
  'members/[id]/role/route.ts': {
    load: () => import('@/app/api/members/[id]/role/route'),
    methods: { POST: onMember({ role: 'researcher' }) },
  },
  'members/[id]/end/route.ts': {
    load: () => import('@/app/api/members/[id]/end/route'),
    methods: { POST: onMember({}) },
  },
  'members/[id]/sign-out/route.ts': {
    load: () => import('@/app/api/members/[id]/sign-out/route'),
    methods: { POST: onMember({}) },
  },
  'account/password/route.ts': {
    load: () => import('@/app/api/account/password/route'),
    methods: {
      POST: { may: ROLES, own: () => [{ name: 'half a body', call: { body: { current: 'x' } }, status: 400 }] },
    },
  },
  'account/leave/route.ts': {
    load: () => import('@/app/api/account/leave/route'),
    methods: {
      POST: { may: ROLES, own: () => [{ name: 'unknown member', call: { body: { userId: v7() } }, status: 400 }] },
    },
  },
  'account/team/route.ts': {
    load: () => import('@/app/api/account/team/route'),
    methods: {
      POST: {
        may: ROLES,
        own: () => [{ name: 'malformed id', call: { body: { team: '..' } }, status: 400 }],
        pairs: ({ other }) => [
          {
            name: 'team',
            foreign: { body: { team: other.team.teamId } },
            unknown: { body: { team: UNKNOWN } },
            status: 404,
          },
        ],
      },
    },
  },
  'account/sessions/[id]/end/route.ts': {
    load: () => import('@/app/api/account/sessions/[id]/end/route'),
    methods: {
      POST: {
        may: ROLES,
        own: async ({ other, tenant, member }) => {
          const colleague = Object.values(tenant.team.members).find(({ userId }) => userId !== member.userId);
          return [
            { name: 'malformed id', call: about('..'), status: 404 },
            { name: 'a stranger’s', call: about(await sessionOf(other.team.members.technician.userId)), status: 404 },
            { name: 'a colleague’s', call: about(await sessionOf(colleague?.userId ?? '')), status: 404 },
          ];
        },
      },
    },
  },
  'account/sessions/end-others/route.ts': {
    load: () => import('@/app/api/account/sessions/end-others/route'),
    methods: { POST: { may: ROLES, own: () => [{ name: 'own', call: { body: {} }, status: 200 }] } },
  },
  'devices/[id]/revoke/route.ts': {
    load: () => import('@/app/api/devices/[id]/revoke/route'),
    methods: {
      POST: {
        may: HAVE_PHONES,
        own: async (asker) => [
          { name: 'own', call: about(await makePhone(asker), { reason: 'Lost in the marsh' }), status: 200 },
          { name: 'no reason', call: about(await makePhone(asker), { reason: ' ' }), status: 400 },
          { name: 'malformed id', call: about('..', { reason: 'Lost' }), status: 404 },
        ],
        pairs: ({ other }) => [
          {
            name: 'phone',
            foreign: about(other.devices.get(other.team.members.technician.userId) ?? '', { reason: 'Lost' }),
            unknown: about(UNKNOWN, { reason: 'Lost' }),
            status: 404,
          },
        ],
      },
    },
  },
  'invitation/accept/route.ts': {
    load: () => import('@/app/api/invitation/accept/route'),
    methods: {
      POST: {
        may: 'public',
        own: () => [
          {
            name: 'no such link',
            call: { body: { token: newSecretLink().token, name: 'A', password: 'x'.repeat(20) } },
            status: 410,
          },
          { name: 'no name', call: { body: { token: 'x', name: '', password: 'x' } }, status: 400 },
        ],
      },
    },
  },
  'password/forgotten/route.ts': {
    load: () => import('@/app/api/password/forgotten/route'),
    methods: {
      POST: {
        may: 'public',
        own: () => [{ name: 'anybody', call: { body: { email: `${v7()}@test.example` } }, status: 200 }],
      },
    },
  },
  'password/reset/route.ts': {
    load: () => import('@/app/api/password/reset/route'),
    methods: {
      POST: {
        may: 'public',
        own: () => [
          { name: 'no such link', call: { body: { token: newSecretLink().token, password: 'x' } }, status: 410 },
        ],
      },
    },
  },
};
