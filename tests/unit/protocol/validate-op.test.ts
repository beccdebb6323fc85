import { describe, expect, it } from 'vitest';
import type { Json } from '@/lib/protocol/canonical-json';
import { OP_KINDS, type Op } from '@/lib/protocol/op';
import { parseStrictJson } from '@/lib/protocol/strict-json';
import { validateOp } from '@/lib/protocol/validate-op';
import { freshIds, markOp } from '@/tests/support/wire/first-visit';
import { type WireOpInput, sha256Hex, wireOp } from '@/tests/support/wire/wire-op';

const ids = freshIds();
const ID = '017f22e2-79b0-7cc3-98c4-dc0c0c07398f';

/** Outcome and code of an operation, or `valid`. */
function verdict(value: unknown): string {
  const checked = validateOp(value as Json, sha256Hex);
  return checked.ok ? 'valid' : `${checked.error.r} ${checked.error.code}`;
}

/** A right mark with members of the envelope replaced afterwards. */
function envelope(changes: Record<string, unknown>): unknown {
  return { ...markOp(ids, { q: 0, r: 0, state: 'egg' }), ...changes };
}

/** A right mark without one member. */
function without(name: keyof Op): unknown {
  return Object.fromEntries(Object.entries(markOp(ids, { q: 0, r: 0, state: 'egg' })).filter(([key]) => key !== name));
}

const mark = (body: Record<string, Json | undefined>) =>
  wireOp({
    kind: 'cell.mark',
    ...ids,
    body: { q: 0, r: 0, state: 'egg', nectar: false, unsure: false, ...body } as WireOpInput['body'],
  });
const timed = (wall: string) =>
  wireOp({ kind: 'reading.submit', ...ids, body: {}, at: { wall, mono: 1, boot: ID, skewMs: null } });
const nest = (body: WireOpInput['body']) =>
  wireOp({ kind: 'nest.open', nest: ids.nest, body: { code: 'N1', ...body } });
const field = (body: WireOpInput['body']) =>
  wireOp({ kind: 'field.set', nest: ids.nest, body: { entity: 'nest', base: null, ...body } });

/** Bodies that each kind takes. */
const GOOD: Record<(typeof OP_KINDS)[number], WireOpInput['body']> = {
  'nest.open': {
    code: 'N12',
    name: 'Bandstand',
    taxon: 'Polistes fuscatus',
    place: { lat: 43.598, lon: -77.605, accuracyM: 4 },
  },
  'visit.open': { purpose: 'take-down', startedAt: '2026-06-16T05:35:00-04:00' },
  'reading.open': { kind: 'field', source: 'phone', aid: 'headlamp', light: null },
  'cell.mark': {
    q: 3,
    r: -3,
    state: 'small',
    nectar: true,
    unsure: false,
    reused: true,
    scrap: true,
    instar: 3,
    note: 'seen twice',
    supersedes: ID,
  },
  'cell.retract': { target: ID },
  'reading.submit': {},
  'field.set': { entity: 'nest', field: 'name', value: 'Bandstand roof', base: null },
  'note.set': { entity: 'visit', text: 'wet morning', base: [ID] },
  'step.mark': { step: 'take down', phase: 'start' },
  'behaviour.add': { mode: 'scan', behaviour: 'fanning' },
  'sting.add': { person: null, bodySite: 'left hand', symptoms: ['swelling'] },
  'photo.attach': { photoId: ID, sha256: 'a'.repeat(64), bytes: 1, mime: 'image/jpeg', cell: { q: 1, r: 1 } },
  'photo.detach': { photoId: ID },
  'entity.archive': { entity: 'nest', reason: 'opened twice' },
};

describe('a right operation', () => {
  it.each(OP_KINDS)('of kind %s is valid', (kind) => {
    expect(verdict(wireOp({ kind, ...ids, body: GOOD[kind] }))).toBe('valid');
  });

  it('keeps every kind of writing as it is (B28, B31)', () => {
    const note = 'e\u0301 \u00e9 👩‍🔬 \u05d0\u200f \u202e backwards \u{1f9a0} tab\there\nnew line';
    const checked = validateOp(mark({ note }) as unknown as Json, sha256Hex);
    expect(checked.ok && checked.value.body.note).toBe(note);
  });

  it('writes −0 as 0 before hashing (B26)', () => {
    const op = mark({ q: 0 });
    expect(verdict({ ...op, body: { ...op.body, q: -0 } })).toBe('valid');
  });
});

describe('the form of an operation', () => {
  it.each<[string, unknown, string]>([
    ['null', null, 'quarantined shape'],
    ['a list', [], 'quarantined shape'],
    ['a text', 'op', 'quarantined shape'],
    ['a version 0 envelope', envelope({ v: 0 }), 'quarantined shape'],
    ['a version 2 envelope, for a newer server', envelope({ v: 2 }), 'parked newer'],
    ['a kind that is a number', envelope({ kind: 7 }), 'quarantined shape'],
    ['an hlc that is no clock', envelope({ hlc: 'now' }), 'quarantined shape'],
    ['deps that are no list', envelope({ deps: ID }), 'quarantined shape'],
    ['a body that is a list', envelope({ body: [] }), 'quarantined shape'],
    [
      'a time without boot',
      envelope({ at: { wall: '2026-06-16T05:41:07Z', mono: 1, skewMs: null } }),
      'quarantined shape',
    ],
    ['a nest that is a number', envelope({ nest: 5 }), 'quarantined shape'],
    [
      'a skew that is a text',
      envelope({ at: { wall: '2026-06-16T05:41:07Z', mono: 1, boot: ID, skewMs: '5' } }),
      'quarantined shape',
    ],
    ['a further member (B11)', envelope({ teamId: ID }), 'quarantined unknown-field'],
    ['an actor (B11)', envelope({ actor: ID }), 'quarantined unknown-field'],
    ['a role in the body (B11)', mark({ role: 'reviewer' }), 'quarantined unknown-field'],
    [
      'a further member of the time',
      envelope({ at: { wall: '2026-06-16T05:41:07Z', mono: 1, boot: ID, skewMs: null, skewAge: 3 } }),
      'quarantined unknown-field',
    ],
    ['a null opId (B15)', envelope({ opId: null }), 'quarantined id'],
    ['an upper-case opId (B15)', envelope({ opId: ID.toUpperCase() }), 'quarantined id'],
    ['an opId in braces (B15)', envelope({ opId: `{${ID}}` }), 'quarantined id'],
    ['an opId of 200 characters (B15)', envelope({ opId: 'a'.repeat(200) }), 'quarantined id'],
    ['an opId that is a number', envelope({ opId: 12 }), 'quarantined id'],
    ['a nest that is no id', envelope({ nest: 'N12' }), 'quarantined id'],
    [
      'a boot that is no id',
      envelope({ at: { wall: '2026-06-16T05:41:07Z', mono: 1, boot: 'b7', skewMs: null } }),
      'quarantined id',
    ],
    ['a device that is no id', envelope({ deviceId: 'phone' }), 'quarantined id'],
    ['a lone surrogate (B29)', mark({ note: 'a\ud800b' }), 'quarantined unicode'],
    ['a lone surrogate in a member name', envelope({ body: { '\udfff': 1 } }), 'quarantined unicode'],
    ['a NUL (B30)', mark({ note: 'a\u0000b' }), 'quarantined control'],
    ['a vertical tab (B30)', mark({ note: 'a\u000bb' }), 'quarantined control'],
    ['a carriage return (B30)', mark({ note: 'a\rb' }), 'quarantined control'],
    ['2^53 + 1 (B26)', envelope({ body: { q: 9007199254740992, r: 0 } }), 'quarantined number'],
    ['1e309 (B26)', envelope({ body: { q: Infinity, r: 0 } }), 'quarantined number'],
    [
      'an infinite monotonic reading',
      envelope({ at: { wall: '2026-06-16T05:41:07Z', mono: Infinity, boot: ID, skewMs: null } }),
      'quarantined number',
    ],
    ['half a counter', envelope({ n: 1.5 }), 'quarantined number'],
    ['a counter below zero', envelope({ n: -1 }), 'quarantined number'],
    ['21 dependencies (B22)', envelope({ deps: Array(21).fill(ID) }), 'quarantined deps'],
    ['1,000 dependencies (B22)', envelope({ deps: Array(1_000).fill(ID) }), 'quarantined deps'],
    ['a dependency that is no id', envelope({ deps: ['first'] }), 'quarantined deps'],
    ['a dependency that is a number', envelope({ deps: [1] }), 'quarantined deps'],
    ['itself as a dependency (B22)', envelope({ opId: ID, deps: [ID] }), 'quarantined deps'],
  ])('%s', (_what, op, expected) => {
    expect(verdict(op)).toBe(expected);
  });

  it.each(['__proto__', 'constructor'])('a member named %s is one too many (B10)', (name) => {
    const text = JSON.stringify(markOp(ids, { q: 0, r: 0, state: 'egg' }));
    const inEnvelope = parseStrictJson(text.replace('{', `{"${name}":{"polluted":true},`));
    const inBody = parseStrictJson(text.replace('"body":{', `"body":{"${name}":{"polluted":true},`));
    expect(inEnvelope.ok && verdict(inEnvelope.value.value)).toBe('quarantined unknown-field');
    expect(inBody.ok && verdict(inBody.value.value)).toBe('quarantined unknown-field');
    expect('polluted' in {}).toBe(false);
  });

  it.each([
    'v',
    'opId',
    'kind',
    'kindV',
    'deviceId',
    'n',
    'nest',
    'visit',
    'reading',
    'at',
    'hlc',
    'deps',
    'body',
  ] as const)('without %s is set aside for its shape', (name) => {
    expect(verdict(without(name))).toBe('quarantined shape');
  });
});

describe('kind and version', () => {
  it.each([-1, 0, 1.5, '1', true, null, [1]])('a kindV of %j is set aside (B19)', (kindV) => {
    expect(verdict(envelope({ kindV }))).toBe('quarantined kind');
  });

  it('an unknown kind and a newer version wait for a newer server (B18)', () => {
    expect(verdict(envelope({ kind: 'nest.weigh' }))).toBe('parked newer');
    expect(verdict(envelope({ kindV: 999 }))).toBe('parked newer');
    expect(verdict(envelope({ kind: 'constructor' }))).toBe('parked newer');
  });
});

describe('times', () => {
  it.each([
    ['2026-13-40', 'quarantined time'],
    ['1781602867120', 'quarantined time'],
    ['yesterday', 'quarantined time'],
    ['2026-06-16T05:41:07+26:00', 'quarantined tz'],
    ['2026-06-16T05:41:07[Europe/Nowhere]', 'quarantined tz'],
    ['2026-06-16T24:00:00-04:00', 'valid'],
    ['2016-12-31T23:59:60Z', 'valid'],
    ['0001-01-01T00:00:00Z', 'valid'],
    ['9999-12-31T23:59:59Z', 'valid'],
    ['2026-06-16T05:41:07', 'valid'],
  ])('a wall time of %s is %s (B38, B39)', (wall, expected) => {
    expect(verdict(timed(wall))).toBe(expected);
  });

  it('the start of a visit is judged like any wall time', () => {
    const visit = (startedAt: Json) =>
      wireOp({ kind: 'visit.open', ...ids, reading: null, body: { purpose: 'lab', startedAt } });
    expect(verdict(visit('2026-13-40'))).toBe('quarantined time');
    expect(verdict(visit('2026-06-16T05:41:07+26:00'))).toBe('quarantined tz');
    expect(verdict(visit(5))).toBe('quarantined value');
  });
});

describe('bodies', () => {
  it.each<[string, unknown, string]>([
    ['q is a half (B23)', mark({ q: 0.5 }), 'cell'],
    ['q is a text (B23)', mark({ q: '1' }), 'cell'],
    ['q is in Arabic digits (B23)', mark({ q: '\u0661' }), 'cell'],
    ['r is 41 (B23)', mark({ q: 0, r: 41 }), 'cell'],
    ['q + r is 41 (B23)', mark({ q: 21, r: 20 }), 'cell'],
    [
      'r is missing',
      wireOp({ kind: 'cell.mark', ...ids, body: { q: 1, state: 'egg', nectar: false, unsure: false } }),
      'cell',
    ],
    [
      'a photographed cell is off the comb',
      wireOp({ kind: 'photo.attach', ...ids, body: { ...GOOD['photo.attach'], cell: { q: 99, r: 0 } } }),
      'cell',
    ],
    ['the state is unknown (B24)', mark({ state: 'larva' }), 'value'],
    ['the state is a number (B24)', mark({ state: 3 }), 'value'],
    ['the state is a list (B24)', mark({ state: ['egg'] }), 'value'],
    ['nectar is a word', mark({ nectar: 'yes' }), 'value'],
    ['the instar is 6', mark({ instar: 6 }), 'value'],
    [
      'the purpose is unknown',
      wireOp({ kind: 'visit.open', ...ids, body: { purpose: 'party', startedAt: '2026-06-16T05:35:00-04:00' } }),
      'value',
    ],
    ['the code is empty', nest({ code: '' }), 'value'],
    ['a note of 10,001 code points (B27)', mark({ note: '😀'.repeat(10_001) }), 'too-long'],
    ['a name of 201 code points', nest({ name: 'x'.repeat(201) }), 'too-long'],
    ['a field value of 10,001 code points', field({ field: 'remark', value: 'x'.repeat(10_001) }), 'too-long'],
    ['a name field of 201 code points', field({ field: 'name', value: 'x'.repeat(201) }), 'too-long'],
    ['latitude 91 (B42)', nest({ place: { lat: 91, lon: 0 } }), 'place'],
    ['longitude −181 (B42)', nest({ place: { lat: 0, lon: -181 } }), 'place'],
    ['latitude "51,5" (B42)', nest({ place: { lat: '51,5', lon: 0 } }), 'place'],
    ['accuracy −5 (B42)', nest({ place: { lat: 1, lon: 1, accuracyM: -5 } }), 'place'],
    ['accuracy 1e9 (B42)', nest({ place: { lat: 1, lon: 1, accuracyM: 1e9 } }), 'place'],
    ['a place field off the globe', field({ field: 'place', value: { lat: 91, lon: 0 } }), 'place'],
    ['a place field that is a text', field({ field: 'place', value: 'here' }), 'place'],
    ['a code field that is cleared', field({ field: 'code', value: null }), 'value'],
    ['a taxon field that is a number', field({ field: 'taxon', value: 4 }), 'value'],
    ['a target that is no id', wireOp({ kind: 'cell.retract', ...ids, body: { target: 'x' } }), 'id'],
    ['a base that is no id', field({ field: 'name', value: 'x', base: 'first' }), 'id'],
    ['an entity that is nothing', field({ field: 'name', value: 'x', entity: 'team' }), 'id'],
    ['a further member', wireOp({ kind: 'reading.submit', ...ids, body: { reviewed: true } }), 'unknown-field'],
    ['a further member of the place', nest({ place: { lat: 1, lon: 1, alt: 3 } }), 'unknown-field'],
  ])('%s: %#', (_what, op, code) => {
    expect(verdict(op)).toBe(`quarantined ${code}`);
  });

  it('a note of exactly 10,000 code points is taken', () => {
    expect(verdict(mark({ note: '😀'.repeat(10_000) }))).toBe('valid');
  });

  it('more than 16 KB beside its free text is too long', () => {
    const symptoms = Array<string>(40).fill('😀'.repeat(150));
    expect(verdict(wireOp({ kind: 'sting.add', ...ids, body: { symptoms } }))).toBe('quarantined too-long');
  });

  it('a field this version does not know is kept as it is', () => {
    expect(verdict(field({ field: 'height', value: 2.8 }))).toBe('valid');
  });
});

describe('the body hash', () => {
  it.each([undefined, null, '', 'a'.repeat(64), 5])('of %j is wrong (B17)', (bodyHash) => {
    expect(verdict(envelope({ bodyHash }))).toBe('quarantined hash');
  });

  it('in capitals is another text', () => {
    const op = mark({});
    expect(verdict({ ...op, bodyHash: op.bodyHash.toUpperCase() })).toBe('quarantined hash');
  });

  it('covers what was recorded and when, not how it travels', () => {
    const op = mark({});
    expect(verdict({ ...op, n: op.n + 1, hlc: '1.0', deviceId: ID })).toBe('valid');
    for (const change of [
      { nest: ID },
      { deps: [ID] },
      { at: { ...op.at, mono: 2 } },
      { body: { ...op.body, state: 'small' } },
    ]) {
      expect(verdict({ ...op, ...change })).toBe('quarantined hash');
    }
  });
});
