import { beforeAll, describe, expect, it } from 'vitest';
import * as exportRoute from '@/app/api/export/[file]/route';
import * as broodRoute from '@/app/api/nests/[id]/brood/route';
import * as nestRoute from '@/app/api/nests/[id]/route';
import * as nestsRoute from '@/app/api/nests/route';
import * as readingRoute from '@/app/api/readings/[id]/route';
import type { PullRow } from '@/lib/protocol/pull';
import type { Op } from '@/lib/protocol/op';
import { claim, queue, release } from '@/tests/support/api/review';
import { type ApiCall, callApi, problemOf } from '@/tests/support/factories/call-api';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';
import { type Phone, enrol, pull, push } from '@/tests/support/push/phone';
import { type VisitIds, freshIds, markOp, openingOps } from '@/tests/support/wire/first-visit';
import { wireOp } from '@/tests/support/wire/wire-op';

const CANARY = 'PIERCED-CAP-CANARY';

let team: TestTeam;
let field: Phone;
let lab: Phone;

beforeAll(async () => {
  team = await makeTeam();
  field = await enrol(team.members.technician);
  lab = await enrol(team.members.reviewer, 'lab desk');
});

interface FieldVisit {
  ids: VisitIds;
  /** What the second reader must not receive. */
  marks: Op[];
}

/** A comb of eleven capped cells, one of them with a telling note, read in the field and handed in. */
async function fieldVisit(code: string): Promise<FieldVisit> {
  const ids = freshIds();
  const marks = Array.from({ length: 11 }, (_, q) => markOp(ids, { q, r: 0, state: 'capped', note: CANARY }));
  const about = wireOp({ kind: 'note.set', ...ids, body: { entity: 'reading', text: CANARY, base: null } });
  const submit = wireOp({ kind: 'reading.submit', ...ids, body: {} });
  await push(field, [...openingOps(ids, code), ...marks, about, submit]);
  return { ids, marks };
}

async function pullAll(phone: Phone, limit = 500): Promise<{ rows: PullRow[]; text: string; held: unknown }> {
  const rows: PullRow[] = [];
  let text = '';
  for (let cursor = ''; ;) {
    const page = await pull(phone, `limit=${limit}${cursor}`);
    rows.push(...page.rows);
    text += JSON.stringify(page);
    if (!page.more) return { rows, text, held: page.held };
    cursor = `&cursor=${page.next}`;
  }
}

/** Every byte that a person can get about a nest. */
async function everything(phone: Phone, { ids }: FieldVisit, code: string): Promise<string> {
  const { member } = phone;
  const ask = async (route: Parameters<typeof callApi>[0], call: ApiCall = {}) =>
    (await callApi(route, 'GET', { as: member, ...call })).text();
  const files = ['tallies.csv', 'cells.csv', 'visits.csv', 'nests.csv'].map((file) =>
    ask(exportRoute, { params: { file }, query: `nest=${code}` }),
  );
  const pages = [
    ask(nestsRoute, { query: `q=${code}` }),
    ask(nestRoute, { params: { id: ids.nest } }),
    ask(broodRoute, { params: { id: ids.nest } }),
    ask(readingRoute, { params: { id: ids.reading } }),
  ];
  const waiting = JSON.stringify(await queue(member));
  return [...(await Promise.all([...files, ...pages])), waiting, (await pullAll(phone, 3)).text].join('\n');
}

describe('a second reader', () => {
  it('receives no byte of the first reading from the claim until the own reading is handed in', async () => {
    const visit = await fieldVisit('BLIND-1');
    expect(await everything(lab, visit, 'BLIND-1')).toContain(CANARY);
    await claim(team.members.reviewer, visit.ids.visit);
    const blind = async () => {
      const bytes = await everything(lab, visit, 'BLIND-1');
      expect(bytes).not.toContain(CANARY);
      // The hash of a mark is as good as the mark: there are few of them to try.
      for (const { opId, bodyHash } of visit.marks) {
        expect(bytes).not.toContain(opId);
        expect(bytes).not.toContain(bodyHash);
      }
      expect(bytes).not.toMatch(/"capped":11|"cells":11|,11,0,0/);
      expect(bytes).toContain('"code":"blind"');
    };
    await blind();
    const own = { ...visit.ids, reading: freshIds().reading };
    await push(lab, [
      wireOp({ kind: 'reading.open', ...own, body: { kind: 'second', source: 'photo' } }),
      markOp(own, { q: 0, r: 0, state: 'egg' }),
    ]);
    await blind();
    await push(lab, [wireOp({ kind: 'reading.submit', ...own, body: {} })]);
    expect(await everything(lab, visit, 'BLIND-1')).toContain(CANARY);
  });

  it('gets the log in order without the rows kept back, is told where to go back to, and then gets all of them', async () => {
    const visit = await fieldVisit('BLIND-2');
    const before = await pullAll(lab);
    await claim(team.members.reviewer, visit.ids.visit);
    const during = await pullAll(lab, 4);
    const kept = new Set([...visit.marks.map(({ opId }) => opId)]);
    const shown = before.rows.filter(({ opId, kind, reading }) => {
      return !kept.has(opId) && !(kind === 'note.set' && reading === visit.ids.reading);
    });
    expect(during.rows.map(({ seq }) => seq)).toEqual(shown.map(({ seq }) => seq));
    const opened = before.rows.find(({ kind, reading }) => kind === 'reading.open' && reading === visit.ids.reading);
    const back = `1:${(opened?.seq ?? 0) - 1}`;
    expect(during.held).toEqual([{ visit: visit.ids.visit, cursor: back }]);
    await release(team.members.reviewer, visit.ids.visit);
    const again = await pull(lab, `cursor=${back}`);
    expect(again.held).toEqual([]);
    expect(again.rows.map(({ opId }) => opId)).toEqual(expect.arrayContaining([...kept]));
  });

  it('is blind at that visit only, and nobody else is', async () => {
    const [one, other] = [await fieldVisit('BLIND-3'), await fieldVisit('BLIND-4')];
    await claim(team.members.reviewer, one.ids.visit);
    expect(await everything(lab, other, 'BLIND-4')).toContain(CANARY);
    const seen = await callApi(readingRoute, 'GET', {
      as: team.members.reviewer2,
      params: { id: one.ids.reading },
    });
    expect(seen.status).toBe(200);
    const hidden = await callApi(readingRoute, 'GET', {
      as: team.members.reviewer,
      params: { id: one.ids.reading },
    });
    expect(await problemOf(hidden)).toEqual([403, 'blind']);
  });
});
