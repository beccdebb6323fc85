import { ROLES, type Role } from '@/lib/server/auth/role';
import type { ApiCall } from '@/tests/support/factories/call-api';
import type { Asker, MethodExpectation, RouteExpectation } from './expectation';

const EVERYONE: readonly Role[] = ROLES;
const KEEPERS: readonly Role[] = ['technician', 'reviewer', 'biologist', 'coordinator'];
const LEAD: readonly Role[] = ['biologist'];
const UNKNOWN = '01890000-0000-7000-8000-00000000dead';
const TEXT = 'time,temp °C\n2026-06-02 05:00,20\n2026-06-02 06:00,21';
const REASON = { reason: 'Wrong logger.' };

let kept = 0;

/** Days nobody has kept yet, so that asking again is no repetition. */
function freshDays() {
  kept += 1;
  return { days: [{ date: '2026-06-01', min: 10, max: 20 + kept / 1000 }] };
}

/** A change of one nest's temperature, or a look at it. */
function aboutNest(may: readonly Role[], body?: () => object): MethodExpectation {
  const about = (id: string): ApiCall => ({ params: { id }, ...(body && { body: body() }) });
  return {
    may,
    own: ({ tenant: { shared, only } }) => [
      { name: 'own, with an id the other team uses too', call: about(shared.nest), status: 200 },
      { name: 'own', call: about(only.nest), status: 200 },
      { name: 'malformed id', call: about("' OR 1=1--"), status: 404 },
    ],
    pairs: ({ other }) => [{ name: 'nest', foreign: about(other.only.nest), unknown: about(UNKNOWN), status: 404 }],
  };
}

/** Something about one record: the other team's is found under neither its own nest nor the asker's. */
function recordPairs(body?: object): MethodExpectation['pairs'] {
  const about = (id: string, record: string): ApiCall => ({ params: { id, record }, ...(body && { body }) });
  return ({ tenant, other }: Asker) => [
    {
      name: 'record in the own nest',
      foreign: about(tenant.only.nest, other.temperature),
      unknown: about(tenant.only.nest, UNKNOWN),
      status: 404,
    },
    {
      name: 'record in its nest',
      foreign: about(other.only.nest, other.temperature),
      unknown: about(UNKNOWN, UNKNOWN),
      status: 404,
    },
  ];
}

/** What the routes about temperature and settings do for whom. */
export const HEAT_EXPECTATIONS: Readonly<Record<string, RouteExpectation>> = {
  'nests/[id]/temperature/route.ts': {
    load: () => import('@/app/api/nests/[id]/temperature/route'),
    methods: { GET: aboutNest(EVERYONE), POST: aboutNest(KEEPERS, freshDays) },
  },
  'nests/[id]/temperature/preview/route.ts': {
    load: () => import('@/app/api/nests/[id]/temperature/preview/route'),
    methods: { POST: aboutNest(KEEPERS, () => ({ text: TEXT })) },
  },
  'nests/[id]/temperature/[record]/route.ts': {
    load: () => import('@/app/api/nests/[id]/temperature/[record]/route'),
    methods: {
      GET: {
        may: EVERYONE,
        own: ({ tenant: { only, temperature } }) => [
          { name: 'own', call: { params: { id: only.nest, record: temperature } }, status: 200 },
          { name: 'malformed id', call: { params: { id: only.nest, record: '..' } }, status: 404 },
        ],
        pairs: recordPairs(),
      },
    },
  },
  'nests/[id]/temperature/[record]/remove/route.ts': {
    load: () => import('@/app/api/nests/[id]/temperature/[record]/remove/route'),
    methods: {
      POST: {
        may: KEEPERS,
        own: ({ tenant: { only } }) => [
          { name: 'malformed id', call: { params: { id: only.nest, record: '..' }, body: REASON }, status: 404 },
          { name: 'no reason', call: { params: { id: only.nest, record: UNKNOWN }, body: {} }, status: 400 },
        ],
        pairs: recordPairs(REASON),
      },
    },
  },
  'settings/route.ts': {
    load: () => import('@/app/api/settings/route'),
    methods: { GET: { may: EVERYONE, own: () => [{ name: 'all', call: {}, status: 200 }] } },
  },
  'settings/versions/[version]/route.ts': {
    load: () => import('@/app/api/settings/versions/[version]/route'),
    methods: {
      GET: {
        may: EVERYONE,
        own: () => [
          { name: 'defaults', call: { params: { version: '0' } }, status: 200 },
          { name: 'own', call: { params: { version: '1' } }, status: 200 },
          { name: 'none', call: { params: { version: '9' } }, status: 404 },
          { name: 'malformed', call: { params: { version: '-1' } }, status: 404 },
        ],
      },
    },
  },
  'settings/learning/route.ts': {
    load: () => import('@/app/api/settings/learning/route'),
    methods: { GET: { may: EVERYONE, own: () => [{ name: 'all', call: {}, status: 200 }] } },
  },
  'settings/draft/route.ts': {
    load: () => import('@/app/api/settings/draft/route'),
    methods: {
      PUT: {
        may: LEAD,
        own: () => [
          { name: 'nothing', call: { body: {} }, status: 200 },
          { name: 'unknown member', call: { body: { team: UNKNOWN } }, status: 400 },
        ],
      },
    },
  },
  'settings/draft/impact/route.ts': {
    load: () => import('@/app/api/settings/draft/impact/route'),
    methods: {
      GET: {
        may: LEAD,
        own: () => [{ name: 'bad id', call: { query: 'before=x' }, status: 400 }],
      },
    },
  },
  'settings/draft/discard/route.ts': {
    load: () => import('@/app/api/settings/draft/discard/route'),
    methods: { POST: { may: LEAD, own: () => [{ name: 'the draft', call: { body: {} }, status: 200 }] } },
  },
  'settings/sign/route.ts': {
    load: () => import('@/app/api/settings/sign/route'),
    methods: {
      POST: {
        may: LEAD,
        own: () => [{ name: 'without a draft', call: { body: { ...REASON, basedOn: 99 } }, status: 409 }],
      },
    },
  },
};
