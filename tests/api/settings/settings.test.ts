import { beforeAll, describe, expect, it } from 'vitest';
import * as broodRoute from '@/app/api/nests/[id]/brood/route';
import * as discardRoute from '@/app/api/settings/draft/discard/route';
import * as impactRoute from '@/app/api/settings/draft/impact/route';
import * as draftRoute from '@/app/api/settings/draft/route';
import * as learningRoute from '@/app/api/settings/learning/route';
import * as settingsRoute from '@/app/api/settings/route';
import * as signRoute from '@/app/api/settings/sign/route';
import * as versionRoute from '@/app/api/settings/versions/[version]/route';
import type { BroodEstimate } from '@/lib/brood/answer';
import { DEFAULT_CONTENT } from '@/lib/brood/team-settings/content';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import type { LearningAnswer } from '@/lib/server/queries/settings/learning';
import type { SettingsAnswer } from '@/lib/server/queries/settings/settings-answer';
import type { SettingsImpact } from '@/lib/server/queries/settings/settings-impact';
import type { MethodHandlers } from '@/lib/server/http/methods';
import { decided, lock, settle } from '@/tests/support/api/decide';
import { type ApiCall, callApi, problemOf } from '@/tests/support/factories/call-api';
import { makeNest, makeVisit } from '@/tests/support/factories/make-nest';
import { makeReading } from '@/tests/support/factories/make-reading';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';

const TRIAL = { trust: 'low', source: 'own trial' };

let team: TestTeam;

beforeAll(async () => {
  team = await makeTeam();
});

/** What the lead biologist of a team gets. */
async function lead<Answer>(
  route: MethodHandlers,
  call: ApiCall & { method?: 'GET' | 'POST' | 'PUT' } = {},
  of = team,
) {
  const { method = 'GET', ...rest } = call;
  const response = await callApi(route, method, { as: of.members.biologist, ...rest });
  if (response.status !== 200) throw new Error(`${response.status} ${await response.text()}`);
  return (await response.json()) as Answer;
}

const draft = (body: object, of = team) => lead(draftRoute, { method: 'PUT', body }, of);
const sign = (basedOn: number, of = team) =>
  callApi(signRoute, 'POST', { as: of.members.biologist, body: { reason: 'By the trial.', basedOn } });

async function nestWithEgg(of: TestTeam, code: string): Promise<string> {
  const nest = await makeNest(of, { code });
  await makeReading(of, { nest, visit: await makeVisit(of, nest), marks: [{ q: 0, r: 0, state: 'egg' }] });
  return nest;
}

const broodOf = (nest: string, of: TestTeam) =>
  lead<BroodEstimate>(broodRoute, { params: { id: nest }, query: 'asOf=2026-06-16' }, of);

describe('the settings of a team', () => {
  it('are the product’s defaults until somebody signs', async () => {
    const own = await makeTeam();
    const answer = await lead<SettingsAnswer>(settingsRoute, {}, own);
    expect(answer).toMatchObject({ version: 0, signedBy: null, versions: [], draft: null });
    expect(answer.content).toEqual(JSON.parse(JSON.stringify(DEFAULT_CONTENT)));
  });

  it('are changed in a draft that counts for nothing before it is signed, and that others do not see', async () => {
    const own = await makeTeam();
    const nest = await nestWithEgg(own, 'D1');
    const before = await broodOf(nest, own);
    await draft({ values: { foundingLead: { value: 9, ...TRIAL } } }, own);
    await draft({ values: { lossEgg: { value: 0.05, ...TRIAL } } }, own);
    expect((await broodOf(nest, own)).inputDigest).toBe(before.inputDigest);
    const { draft: seen } = await lead<SettingsAnswer>(settingsRoute, {}, own);
    expect(seen).toMatchObject({ basedOn: 0, editedBy: 'The biologist' });
    expect(seen?.content.values).toMatchObject({ foundingLead: { value: 9 }, lossEgg: { value: 0.05 } });
    const others = await callApi(settingsRoute, 'GET', { as: own.members.reviewer });
    expect(await others.json()).toMatchObject({ version: 0, draft: null });
  });

  it('are signed as a version that keeps name, time and reason; old estimates keep theirs', async () => {
    const own = await makeTeam();
    const nest = await nestWithEgg(own, 'S1');
    const before = await broodOf(nest, own);
    const [row] = DEFAULT_CONTENT.durations.filter(({ taxon }) => taxon === 'Polistes');
    const durations = [{ ...row, egg: 20, source: 'own trial' }];
    await draft({ values: { foundingLead: { value: 9, ...TRIAL } }, durations }, own);
    expect(await (await sign(0, own)).json()).toEqual({ version: 1 });
    const after = await broodOf(nest, own);
    expect([after.settings.version, after.durations.egg]).toEqual(['1', 20]);
    expect(after.nest.founded?.median).not.toBe(before.nest.founded?.median);
    const answer = await lead<SettingsAnswer>(settingsRoute, {}, own);
    expect(answer).toMatchObject({ version: 1, signedBy: 'The biologist', reason: 'By the trial.', draft: null });
    const rows = await database().models.Estimate.findAll({ where: { team_id: toBinary(own.teamId) }, raw: true });
    expect(rows.map((kept) => kept.settings_version).sort((a, b) => a - b)).toEqual([0, 1]);
    const chain = await database().models.AuditEntry.findAll({ where: { team_id: toBinary(own.teamId) }, raw: true });
    expect(chain.map(({ action }) => action)).toEqual(['settings.sign']);
    const first = await callApi(versionRoute, 'GET', { as: own.members.researcher, params: { version: '0' } });
    expect(await first.json()).toMatchObject({ version: 0, content: { values: { foundingLead: { value: 1 } } } });
  });

  it('cannot be changed once signed, not even in the database', async () => {
    const own = await makeTeam();
    await draft({ values: { lossEgg: { value: 0.05, ...TRIAL } } }, own);
    await sign(0, own);
    const where = { team_id: toBinary(own.teamId) };
    await expect(database().models.SettingsVersion.update({ reason: 'x' }, { where })).rejects.toThrow('append-only');
    await expect(database().models.DurationSet.destroy({ where })).rejects.toThrow('append-only');
  });

  it.each<[string, object, string]>([
    [
      'a confusion row that does not add up to 1',
      { confusion: { L4: { row: { medium: 0.8 }, ...TRIAL } } },
      'Confusion, row L4: the shares add up to 0.8, not to 1.',
    ],
    [
      'a number out of range',
      { values: { lossEgg: { value: 2, ...TRIAL } } },
      'Loss of eggs: must be between 0 and 1 per day.',
    ],
    ['a name that is no setting', { values: { wings: { value: 2, ...TRIAL } } }, 'wings is not a setting.'],
    ['no row for the genus', { durations: [] }, 'a row for Polistes is needed'],
  ])('refuse %s, and say why', async (_name, body, words) => {
    const response = await callApi(draftRoute, 'PUT', { as: team.members.biologist, body });
    const problem = (await response.json()) as { code: string; detail: string };
    expect([response.status, problem.code]).toEqual([422, 'settings']);
    expect(problem.detail).toContain(words);
    expect((await lead<SettingsAnswer>(settingsRoute)).draft).toBeNull();
  });

  it('cannot be signed without a draft, or when another version came between', async () => {
    const own = await makeTeam();
    expect(await problemOf(await sign(0, own))).toEqual([409, 'no-draft']);
    await draft({ values: { lossEgg: { value: 0.05, ...TRIAL } } }, own);
    expect(await problemOf(await sign(3, own))).toEqual([409, 'settings-moved']);
    const discard = { method: 'POST' as const, body: {} };
    expect(await lead(discardRoute, discard, own)).toEqual({ discarded: true });
    expect(await lead(discardRoute, discard, own)).toEqual({ discarded: false });
    expect(await problemOf(await sign(0, own))).toEqual([409, 'no-draft']);
  });

  it('are signed once when two people press at the same moment', async () => {
    const own = await makeTeam();
    await draft({ values: { lossEgg: { value: 0.05, ...TRIAL } } }, own);
    const answers = await Promise.all([sign(0, own), sign(0, own)]);
    expect(answers.map(({ status }) => status).sort((a, b) => a - b)).toEqual([200, 409]);
    expect((await lead<SettingsAnswer>(settingsRoute, {}, own)).versions).toHaveLength(1);
  });
});

describe('what a draft would move', () => {
  it('comes in parts of a few nests, each nest once, with the shift of its likeliest days', async () => {
    const own = await makeTeam();
    const codes = ['A', 'B', 'C', 'D', 'E', 'F', 'G'];
    for (const code of codes) await nestWithEgg(own, code);
    await makeNest(own, { code: 'nobody read it' });
    await draft({ values: { foundingLead: { value: 4, ...TRIAL } } }, own);
    const parts: SettingsImpact[] = [];
    let next: string | null | undefined;
    do {
      parts.push(await lead<SettingsImpact>(impactRoute, { query: next ? `after=${next}` : '' }, own));
      next = parts.at(-1)?.next;
    } while (next);
    const nests = parts.flatMap((part) => part.nests);
    expect(parts.length).toBeGreaterThan(1);
    expect(parts.every(({ total, looked }) => total === 8 && looked <= 5)).toBe(true);
    expect(nests.map(({ code }) => code).sort()).toEqual(codes);
    for (const { founded, firstEmergence } of nests) expect([founded.days, firstEmergence.days]).toEqual([-3, 0]);
  });

  it('needs a draft, and an id to go on from', async () => {
    const own = await makeTeam();
    const as = own.members.biologist;
    expect(await problemOf(await callApi(impactRoute, 'GET', { as }))).toEqual([409, 'no-draft']);
    await draft({ values: { lossEgg: { value: 0.05, ...TRIAL } } }, own);
    expect(await problemOf(await callApi(impactRoute, 'GET', { as, query: 'after=x' }))).toEqual([400, 'param']);
  });
});

describe('what the team’s own readings say', () => {
  it('comes from locked double readings and followed broods, with n, and changes no estimate', async () => {
    const own = await makeTeam();
    const nest = await makeNest(own, { code: 'L1' });
    const states = ['egg', 'egg', 'small', 'large', 'large', 'large', 'large', 'capped'] as const;
    for (const [i, state] of states.entries()) {
      const visit = await makeVisit(own, nest, {
        startedAt: `2026-06-${String(1 + 3 * i).padStart(2, '0')}T08:00:00.000-04:00`,
      });
      const field = await makeReading(own, { nest, visit, marks: [{ q: 0, r: 0, state }] });
      if (i > 0) continue;
      await makeReading(own, { nest, visit, kind: 'second', marks: [{ q: 0, r: 0, state: 'empty' }] });
      await decided(await settle(own.members.biologist, field, [{ q: 0, r: 0, state: 'egg' }]));
      await decided(await lock(own.members.biologist, field));
    }
    const before = (await broodOf(nest, own)).inputDigest;
    const answer = await lead<LearningAnswer>(learningRoute, {}, own);
    expect(answer).toMatchObject({ version: 0, pseudoCount: 50, cells: 2 });
    expect(answer.confusion).toMatchObject([{ name: 'egg', n: 2, counts: { egg: 1, empty: 1 } }]);
    // (0.94·50 + 1) / 52.
    expect(answer.confusion[0]?.posterior.egg).toBeCloseTo(48 / 52, 12);
    // Egg to larva on day 4.5, larva to capped on day 19.5: 15 days for a larva said to take 20.
    expect(answer.durations).toMatchObject([{ row: { taxon: 'Polistes fuscatus' }, nests: 1, broods: 1 }]);
    expect(answer.durations[0]?.posterior.median).toBeLessThan(1);
    expect((await broodOf(nest, own)).inputDigest).toBe(before);
  });
});
