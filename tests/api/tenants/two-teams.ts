import { v7 } from 'uuid';
import { memberContext } from '@/lib/server/auth/member-context';
import { amendReading } from '@/lib/server/commands/readings/amend-reading';
import { saveDraft } from '@/lib/server/commands/settings/save-draft';
import { signSettings } from '@/lib/server/commands/settings/sign-settings';
import { keepTemperature } from '@/lib/server/commands/temperature/keep-temperature';
import { lockReading } from '@/lib/server/commands/readings/lock-reading';
import { settleReading } from '@/lib/server/commands/readings/settle-reading';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { makeNest, makeVisit } from '@/tests/support/factories/make-nest';
import { makeReading } from '@/tests/support/factories/make-reading';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';
import { makeInvitation } from '@/tests/support/members/make-invitation';

const NOW = Date.parse('2026-06-20T12:00:00Z');

/** The ids of one nest with a visit, a reading and a mark. */
export interface EntityIds {
  nest: string;
  visit: string;
  reading: string;
  mark: string;
}

/** One of two teams that share a server, with everything a text can be put into marked as its own. */
export interface Tenant {
  team: TestTeam;
  /** Stands in every text of this team, and nowhere else. */
  canary: string;
  /** Entities whose ids the other team uses too. */
  shared: EntityIds;
  /** Entities only this team has. */
  only: EntityIds;
  /** Code of the nest that only this team has. */
  onlyCode: string;
  /** An unanswered invitation of this team. */
  invitation: string;
  /** A temperature record of that nest. */
  temperature: string;
  /** `X-Device` of an enrolled phone by user id. */
  devices: ReadonlyMap<string, string>;
  /** Texts that may reach nobody of the other team. */
  secrets: readonly string[];
}

function freshIds(): EntityIds {
  return { nest: v7(), visit: v7(), reading: v7(), mark: v7() };
}

async function makeEntities(
  team: TestTeam,
  ids: EntityIds,
  { code, canary, lat }: { code: string; canary: string; lat: number },
): Promise<void> {
  const place = { lat, lon: -77.25, accuracyM: 3 };
  await makeNest(team, { id: ids.nest, code, name: `Nest ${canary}`, taxon: `Polistes ${canary}`, place });
  await makeVisit(team, ids.nest, { id: ids.visit });
  const mark = { q: 0, r: 0, state: 'egg', note: `Note ${canary}`, opId: ids.mark } as const;
  await makeReading(team, { ...ids, id: ids.reading, aid: `Mirror ${canary}`, marks: [mark] });
}

/** Rows of the tables that no phone fills. */
async function makeOffice(team: TestTeam, nest: string, canary: string): Promise<void> {
  const own = { team_id: toBinary(team.teamId), id: toBinary(v7()) };
  const { Host, Taxon, Outcome, QuarantinedOp } = database().models;
  const place = { place_name: `Shed ${canary}`, lat: 1.5, lon: 2.5 };
  await Host.create({
    ...own,
    ...place,
    code: `H ${canary}`,
    name: `Host ${canary}`,
    capacity: 1,
    note: `Dog ${canary}`,
    withdrawn_on: null,
  });
  await Taxon.create({ ...own, scientific_name: `Polistes ${canary}`, status: 'native' });
  await Outcome.create({
    ...own,
    nest_id: toBinary(nest),
    outcome: `raised ${canary}`,
    decided_on: '2026-07-01',
    note: canary,
  });
  const actor_id = toBinary(team.members.technician.userId);
  const kept = { state: 'parked', code: 'deps', raw: `{"note":"${canary}"}`, missing: '[]' };
  await QuarantinedOp.create({
    ...own,
    ...kept,
    digest: Buffer.alloc(32),
    op_id: null,
    actor_id,
    received_at: new Date(NOW),
  });
}

async function enrolAll(team: TestTeam, canary: string): Promise<Map<string, string>> {
  const devices = new Map<string, string>();
  for (const { userId } of Object.values(team.members)) {
    const id = v7();
    const when = { enrolled_at: new Date(NOW), last_seen_at: new Date(NOW), revoked_at: null };
    const own = { team_id: toBinary(team.teamId), id: toBinary(id), user_id: toBinary(userId) };
    await database().models.Device.create({ ...own, ...when, label: `Phone ${canary}`, device_key: Buffer.alloc(32) });
    devices.set(userId, id);
  }
  return devices;
}

/** A signed version and a draft of the settings, and a temperature record; returns the record's id. */
async function makeSettingsAndTemperature(ctx: TeamContext, nest: string, canary: string): Promise<string> {
  const values = { lossEgg: { value: 0.02, trust: 'low' as const, source: `Trial ${canary}` } };
  await saveDraft(ctx, { values }, NOW);
  await signSettings(ctx, { reason: `Signed ${canary}`, basedOn: 0 }, NOW);
  await saveDraft(ctx, { values }, NOW);
  const text = `time,${canary} °C\n2026-06-02 05:00,20\n2026-06-02 06:00,21`;
  const { id } = await keepTemperature(ctx, { id: nest, input: { text, fileName: `${canary}.csv` } }, NOW);
  return id;
}

async function makeTenant(canary: string, shared: EntityIds, lat: number): Promise<Tenant> {
  const team = await makeTeam({ name: `Programme ${canary}`, canary: ` ${canary}` });
  const [only, onlyCode] = [freshIds(), `ONLY-${canary}`];
  await makeEntities(team, shared, { code: 'N12', canary, lat });
  await makeEntities(team, only, { code: onlyCode, canary, lat });
  await makeOffice(team, shared.nest, canary);
  const ctx = await memberContext(team.teamId, team.members.biologist.userId);
  const cells = [{ q: 0, r: 0, state: 'small' as const, reason: `Reason ${canary}` }];
  const { reading: final } = await settleReading(ctx, { id: shared.reading, cells }, NOW);
  await lockReading(ctx, { id: final }, NOW);
  await amendReading(ctx, { id: final, reason: `Amended ${canary}` }, NOW);
  const invitation = await makeInvitation(team.teamId, canary);
  const temperature = await makeSettingsAndTemperature(ctx, only.nest, canary);
  const people = Object.values(team.members).map(({ userId }) => userId);
  const secrets = [canary, String(lat), team.teamId, final, invitation, temperature, ...Object.values(only), ...people];
  const devices = await enrolAll(team, canary);
  return { team, canary, shared, only, onlyCode, invitation, temperature, devices, secrets };
}

/** Two teams whose nests, visits, readings and operations have the same ids, and one nest each of its own. */
export async function makeTwoTeams(): Promise<{ a: Tenant; b: Tenant }> {
  const shared = freshIds();
  return {
    a: await makeTenant('CANARY-ALDER', shared, 11.123456),
    b: await makeTenant('CANARY-BIRCH', shared, 22.654321),
  };
}
