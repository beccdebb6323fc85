import 'server-only';
import { createHash } from 'node:crypto';
import type { Transaction } from 'sequelize';
import { DEFAULT_SETTINGS } from '@/lib/brood/settings';
import { database } from '@/lib/server/db/database';
import { inTransaction } from '@/lib/server/db/in-transaction';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { demoId } from '@/lib/server/demo/build/demo-id';
import { instantOf } from '@/lib/server/demo/build/demo-time';
import { deviceId, teamId, userId } from '@/lib/server/demo/build/names';
import type { TeamStory } from '@/lib/server/demo/story/team-story';
import { may } from '@/lib/server/policies/may';

/** When the team was set up: settings signed, devices enrolled. */
const SET_UP_AT = '2026-04-02T09:00';

/** No phone holds this key: the demo's devices only say where the season's operations came from. */
function deviceKey(device: string): Buffer {
  return createHash('sha256').update(`no phone ${device}`, 'utf8').digest();
}

async function writePeople(team: TeamStory, passwordHash: string, transaction: Transaction): Promise<void> {
  const { Device, Membership, User } = database().models;
  const team_id = toBinary(teamId(team));
  const enrolled = new Date(instantOf(SET_UP_AT, team.offset));
  for (const person of team.people) {
    const user_id = toBinary(userId(person));
    const account = {
      id: user_id,
      email: person.email,
      display_name: person.name,
      password_hash: passwordHash,
      disabled_at: null,
    };
    await User.create(account, { transaction });
    await Membership.create({ team_id, user_id, role: person.role }, { transaction });
    if (!may(person.role, 'sync.enrol')) continue;
    const id = deviceId(person);
    const times = { enrolled_at: enrolled, last_seen_at: enrolled, revoked_at: null };
    const label = person.role === 'technician' ? 'Field phone' : 'Lab desk';
    await Device.create(
      { team_id, id: toBinary(id), user_id, label, device_key: deviceKey(id), ...times },
      { transaction },
    );
  }
}

async function writeSettings(team: TeamStory, transaction: Transaction): Promise<void> {
  const { DurationSet, SettingsVersion } = database().models;
  const team_id = toBinary(teamId(team));
  const { durations, values } = DEFAULT_SETTINGS;
  const signed = {
    signed_by: team.settingsSignedBy && toBinary(userId(team.settingsSignedBy)),
    signed_at: new Date(instantOf(SET_UP_AT, team.offset)),
  };
  await SettingsVersion.create({ team_id, version: 1, settings: JSON.stringify(values), ...signed }, { transaction });
  const rows = durations.map(({ taxon, egg, larva, capped, referenceC, trust, source }) => ({
    ...{ team_id, version: 1, taxon, trust, source },
    ...{ egg_days: egg, larva_days: larva, capped_days: capped, reference_c: referenceC },
  }));
  await DurationSet.bulkCreate(rows, { transaction });
}

async function writePlacesAndKinds({ hosts, taxa, ...team }: TeamStory, transaction: Transaction): Promise<void> {
  const { Host, Taxon } = database().models;
  const team_id = toBinary(teamId(team));
  const hostRows = hosts.map(({ code, name, placeName, lat, lon, capacity, note, withdrawnOn }) => ({
    ...{ team_id, id: toBinary(demoId(`host/${code}`)), code, name, place_name: placeName },
    ...{ lat, lon, capacity, note, withdrawn_on: withdrawnOn },
  }));
  await Host.bulkCreate(hostRows, { transaction });
  const taxonRows = taxa.map(({ scientificName, status }) => ({
    team_id,
    id: toBinary(demoId(`taxon/${scientificName}`)),
    scientific_name: scientificName,
    status,
  }));
  await Taxon.bulkCreate(taxonRows, { transaction });
}

/**
 * Writes a team with everything its season needs before the first call: counter, people, devices, settings, hosts
 * and taxa. All or nothing; a team that is there already is left as it is.
 */
export async function writeTeam(team: TeamStory, passwordHash: string): Promise<void> {
  await inTransaction(async (transaction) => {
    const { Team, TeamCounter } = database().models;
    const id = toBinary(teamId(team));
    if (await Team.findByPk(id, { transaction })) return;
    const { name, zone, home } = team;
    await Team.create({ id, name, zone, home_lat: home.lat, home_lon: home.lon }, { transaction });
    await TeamCounter.create(
      { team_id: id, seq: 0, safe_seq: 0, audit_seq: 0, audit_hash: Buffer.alloc(32) },
      { transaction },
    );
    await writePeople(team, passwordHash, transaction);
    await writeSettings(team, transaction);
    await writePlacesAndKinds(team, transaction);
  });
}
