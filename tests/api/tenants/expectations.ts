import { v7 } from 'uuid';
import { ROLES, type Role } from '@/lib/server/auth/role';
import type { ApiCall } from '@/tests/support/factories/call-api';
import { wireOp } from '@/tests/support/wire/wire-op';
import type { Asker, MethodExpectation, RouteExpectation } from './expectation';
import { PEOPLE_EXPECTATIONS } from './people-expectations';
import { HEAT_EXPECTATIONS } from './heat-expectations';

const EVERYONE: readonly Role[] = ROLES;
const RECORDERS: readonly Role[] = ['technician', 'reviewer', 'biologist'];
const SETTLERS: readonly Role[] = ['reviewer', 'biologist'];
const EXPORTERS: readonly Role[] = ['reviewer', 'biologist', 'coordinator', 'researcher'];
const UNKNOWN = '01890000-0000-7000-8000-00000000dead';
const FILES = [
  'nests.csv',
  'visits.csv',
  'tallies.csv',
  'cells.csv',
  'settlements.csv',
  'agreement.csv',
  'dictionary.csv',
  'everything.zip',
];

/** A route about one thing that is named in the path, and read. */
function readOne(may: readonly Role[], kind: 'nest' | 'reading'): MethodExpectation {
  const about = (id: string): ApiCall => ({ params: { id } });
  return {
    may,
    own: ({ tenant: { shared, only } }) => [
      { name: 'own, with an id the other team uses too', call: about(shared[kind]), status: 200 },
      { name: 'own', call: about(only[kind]), status: 200 },
      { name: 'malformed id', call: about("' OR 1=1--"), status: 404 },
    ],
    pairs: ({ other }) => [{ name: 'id', foreign: about(other.only[kind]), unknown: about(UNKNOWN), status: 404 }],
  };
}

/** A decision about one reading. */
function decide(body: object, status: number): MethodExpectation {
  const about = (id: string): ApiCall => ({ params: { id }, body });
  return {
    may: SETTLERS,
    own: ({ tenant: { shared } }) => [
      { name: 'own, with an id the other team uses too', call: about(shared.reading), status },
      { name: 'malformed id', call: about('..'), status: 404 },
      { name: 'unknown member', call: { ...about(shared.reading), body: { ...body, teamId: v7() } }, status: 400 },
    ],
    pairs: ({ other }) => [{ name: 'id', foreign: about(other.only.reading), unknown: about(UNKNOWN), status: 404 }],
  };
}

/** Something about the review of one visit. @param statuses of the request about an own visit; none to leave it out. */
function ofVisit(body: object, statuses: number[]): MethodExpectation {
  const about = (id: string): ApiCall => ({ params: { id }, body });
  return {
    may: SETTLERS,
    own: ({ tenant: { only } }) => [
      ...statuses.map((status) => ({ name: 'own', call: about(only.visit), status })),
      { name: 'malformed id', call: about('..'), status: 404 },
      { name: 'unknown member', call: { ...about(only.visit), body: { ...body, teamId: v7() } }, status: 400 },
    ],
    pairs: ({ other }) => [{ name: 'id', foreign: about(other.only.visit), unknown: about(UNKNOWN), status: 404 }],
  };
}

/** Headers of the asker's enrolled phone. */
function phone({ tenant, member }: Asker): ApiCall {
  return { headers: { 'x-device': tenant.devices.get(member.userId) ?? '' } };
}

/** The phone of the same role in the other team. */
function foreignPhone({ other, member }: Asker): ApiCall {
  const twin = Object.values(other.team.members).find(({ role }) => role === member.role);
  return { headers: { 'x-device': other.devices.get(twin?.userId ?? '') ?? '' } };
}

const UNKNOWN_PHONE: ApiCall = { headers: { 'x-device': UNKNOWN } };

/** A push of one operation that belongs to a nest. */
function push(asker: Asker, ids: { nest: string; visit: string | null }, opId: string): ApiCall {
  const op = wireOp({ ...ids, opId, n: 1, kind: 'note.set', body: { entity: 'nest', text: 'x', base: null } });
  return { ...phone(asker), body: { protocol: 1, schema: 1, epoch: 1, ops: [op] } };
}

const FIXED_OP = v7();

/** What every route file under `app/api` does for whom, by its path. */
export const EXPECTATIONS: Readonly<Record<string, RouteExpectation>> = {
  ...PEOPLE_EXPECTATIONS,
  'nests/route.ts': {
    load: () => import('@/app/api/nests/route'),
    methods: {
      GET: {
        may: EVERYONE,
        own: () => [
          { name: 'all', call: {}, status: 200 },
          { name: 'by cells', call: { query: 'sort=-cells' }, status: 200 },
          { name: 'bad column', call: { query: 'sort=password' }, status: 400 },
        ],
        pairs: ({ other }) => [
          {
            name: 'search',
            foreign: { query: `q=${other.canary}` },
            unknown: { query: 'q=nothing-of-the-kind' },
            status: 200,
          },
          {
            name: 'taxon',
            foreign: { query: `taxon=Polistes%20${other.canary}` },
            unknown: { query: 'taxon=Polistes%20x' },
            status: 200,
          },
        ],
      },
    },
  },
  'nests/[id]/route.ts': {
    load: () => import('@/app/api/nests/[id]/route'),
    methods: { GET: readOne(EVERYONE, 'nest') },
  },
  'nests/[id]/brood/route.ts': {
    load: () => import('@/app/api/nests/[id]/brood/route'),
    methods: { GET: readOne(EVERYONE, 'nest') },
  },
  'readings/[id]/route.ts': {
    load: () => import('@/app/api/readings/[id]/route'),
    methods: { GET: readOne(EVERYONE, 'reading') },
  },
  'readings/[id]/settle/route.ts': {
    load: () => import('@/app/api/readings/[id]/settle/route'),
    methods: { POST: decide({ cells: [{ q: 1, r: 0, state: 'egg', reason: 'By the photo.' }] }, 200) },
  },
  'readings/[id]/amend/route.ts': {
    load: () => import('@/app/api/readings/[id]/amend/route'),
    methods: { POST: decide({ reason: 'By the photo.' }, 409) },
  },
  'readings/[id]/lock/route.ts': {
    load: () => import('@/app/api/readings/[id]/lock/route'),
    methods: { POST: { ...decide({}, 200), own: lockOnce } },
  },
  'readings/[id]/accept/route.ts': {
    load: () => import('@/app/api/readings/[id]/accept/route'),
    methods: { POST: decide({}, 409) },
  },
  'review/route.ts': {
    load: () => import('@/app/api/review/route'),
    methods: { GET: { may: SETTLERS, own: () => [{ name: 'the queue', call: {}, status: 200 }] } },
  },
  'visits/[id]/claim/route.ts': {
    load: () => import('@/app/api/visits/[id]/claim/route'),
    methods: { POST: { ...ofVisit({}, []), own: claimOnce } },
  },
  'visits/[id]/release/route.ts': {
    load: () => import('@/app/api/visits/[id]/release/route'),
    methods: { POST: ofVisit({}, [409]) },
  },
  'visits/[id]/primary/route.ts': {
    load: () => import('@/app/api/visits/[id]/primary/route'),
    methods: { POST: ofVisit({ reading: UNKNOWN, reason: 'By the light.' }, [404]) },
  },
  'export/[file]/route.ts': {
    load: () => import('@/app/api/export/[file]/route'),
    methods: {
      GET: {
        may: EXPORTERS,
        own: ({ tenant }) => [
          ...FILES.map((file) => ({ name: file, call: { params: { file } }, status: 200 })),
          ...FILES.map((file) => ({
            name: `${file}, one nest`,
            call: { params: { file }, query: `nest=${tenant.onlyCode}` },
            status: 200,
          })),
          { name: 'no such file', call: { params: { file: 'people.csv' } }, status: 404 },
        ],
        pairs: ({ other }) =>
          FILES.flatMap((file) => [
            {
              name: `${file} by code`,
              foreign: { params: { file }, query: `nest=${other.onlyCode}` },
              unknown: { params: { file }, query: 'nest=NONE' },
              status: 404,
            },
            {
              name: `${file} by id`,
              foreign: { params: { file }, query: `nest=${other.only.nest}` },
              unknown: { params: { file }, query: `nest=${UNKNOWN}` },
              status: 404,
            },
            {
              name: `${file} by taxon`,
              foreign: { params: { file }, query: `taxon=Polistes%20${other.canary}` },
              unknown: { params: { file }, query: 'taxon=Polistes%20x' },
              status: 200,
            },
          ]),
      },
    },
  },
  'export/counts/route.ts': {
    load: () => import('@/app/api/export/counts/route'),
    methods: {
      GET: {
        may: EXPORTERS,
        own: ({ tenant }) => [
          { name: 'all', call: {}, status: 200 },
          { name: 'one nest', call: { query: `nest=${tenant.onlyCode}` }, status: 200 },
          { name: 'bad date', call: { query: 'from=yesterday' }, status: 400 },
        ],
        pairs: ({ other }) => [
          {
            name: 'code',
            foreign: { query: `nest=${other.onlyCode}` },
            unknown: { query: 'nest=NONE' },
            status: 404,
          },
          {
            name: 'taxon',
            foreign: { query: `taxon=Polistes%20${other.canary}` },
            unknown: { query: 'taxon=Polistes%20x' },
            status: 200,
          },
        ],
      },
    },
  },
  'samples/route.ts': {
    load: () => import('@/app/api/samples/route'),
    methods: {
      POST: {
        may: SETTLERS,
        own: () => [
          { name: 'a month that is over', call: { body: { month: '2025-06' } }, status: 200 },
          { name: 'a month to come', call: { body: { month: '2999-01' } }, status: 400 },
          { name: 'unknown member', call: { body: { month: '2025-06', teamId: v7() } }, status: 400 },
        ],
      },
    },
  },
  'hosts/route.ts': {
    load: () => import('@/app/api/hosts/route'),
    methods: {
      GET: {
        may: ['technician', 'reviewer', 'biologist', 'coordinator'],
        own: () => [{ name: 'all', call: {}, status: 200 }],
      },
    },
  },
  'me/route.ts': {
    load: () => import('@/app/api/me/route'),
    methods: { GET: { may: EVERYONE, own: () => [{ name: 'oneself', call: {}, status: 200 }] } },
  },
  'health/route.ts': {
    load: () => import('@/app/api/health/route'),
    methods: { GET: { may: 'public', own: () => [{ name: 'health', call: {}, status: 200 }] } },
  },
  'sync/v1/enrol/route.ts': {
    load: () => import('@/app/api/sync/v1/enrol/route'),
    methods: {
      POST: { may: RECORDERS, own: () => [{ name: 'a phone', call: { body: { label: 'phone' } }, status: 200 }] },
    },
  },
  'sync/v1/push/route.ts': {
    load: () => import('@/app/api/sync/v1/push/route'),
    methods: {
      POST: {
        may: RECORDERS,
        own: (asker) => [
          { name: 'own nest', call: push(asker, { nest: asker.tenant.only.nest, visit: null }, v7()), status: 200 },
        ],
        pairs: (asker) => [
          {
            name: 'an operation about a nest',
            foreign: push(asker, { nest: asker.other.only.nest, visit: null }, v7()),
            unknown: push(asker, { nest: UNKNOWN, visit: null }, v7()),
            status: 200,
          },
          {
            name: 'phone',
            foreign: pushFrom(asker, foreignPhone(asker)),
            unknown: pushFrom(asker, UNKNOWN_PHONE),
            status: 403,
          },
        ],
      },
    },
  },
  'sync/v1/pull/route.ts': {
    load: () => import('@/app/api/sync/v1/pull/route'),
    methods: {
      GET: {
        may: ['technician', 'reviewer', 'biologist', 'coordinator'],
        own: (asker) => [
          { name: 'from the start', call: phone(asker), status: 200 },
          { name: 'beyond the end', call: { ...phone(asker), query: 'cursor=1:999999999' }, status: 200 },
          { name: 'bad cursor', call: { ...phone(asker), query: 'cursor=abc' }, status: 400 },
        ],
        pairs: (asker) => [{ name: 'phone', foreign: foreignPhone(asker), unknown: UNKNOWN_PHONE, status: 403 }],
      },
    },
  },
  'sync/v1/have/route.ts': {
    load: () => import('@/app/api/sync/v1/have/route'),
    methods: {
      POST: {
        may: RECORDERS,
        own: (asker) => [
          { name: 'own operations', call: { ...phone(asker), body: { opIds: [asker.tenant.only.mark] } }, status: 200 },
        ],
        pairs: (asker) => [
          {
            name: 'operations',
            foreign: { ...phone(asker), body: { opIds: [asker.other.only.mark] } },
            unknown: { ...phone(asker), body: { opIds: [UNKNOWN] } },
            status: 200,
          },
        ],
      },
    },
  },
  'auth/[...nextauth]/route.ts': {
    load: () => import('@/app/api/auth/[...nextauth]/route'),
    otherwise: 405,
    methods: {
      GET: {
        may: 'public',
        own: () =>
          ['session', 'csrf', 'providers'].map((name) => ({
            name,
            call: { params: { nextauth: [name] } },
            status: 200,
          })),
      },
      POST: {
        may: 'public',
        own: () => [{ name: 'no such action', call: { params: { nextauth: ['teams'] }, body: {} }, status: 404 }],
      },
    },
  },
  ...HEAT_EXPECTATIONS,
  '[...path]/route.ts': { load: () => import('@/app/api/[...path]/route'), methods: {}, otherwise: 404 },
};

/** Locking works once for each version, so only the first of several people who may gets through. */
function lockOnce({ tenant: { shared, only } }: Asker): ReturnType<MethodExpectation['own']> {
  return [
    { name: 'malformed id', call: { params: { id: '..' }, body: {} }, status: 404 },
    { name: 'no body', call: { params: { id: only.reading }, body: '' }, status: 400 },
    { name: 'unknown member', call: { params: { id: shared.reading }, body: { version: 1 } }, status: 400 },
  ];
}

/** A claim blinds the person for every later question, so none is made here. */
function claimOnce({ tenant: { only } }: Asker): ReturnType<MethodExpectation['own']> {
  return [
    { name: 'malformed id', call: { params: { id: '..' }, body: {} }, status: 404 },
    { name: 'unknown member', call: { params: { id: only.visit }, body: { reader: UNKNOWN } }, status: 400 },
  ];
}

function pushFrom(asker: Asker, device: ApiCall): ApiCall {
  return { ...push(asker, { nest: asker.tenant.only.nest, visit: null }, FIXED_OP), ...device };
}
