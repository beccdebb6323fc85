import 'server-only';
import type { InferAttributes } from 'sequelize';
import { isUuidText } from '@/lib/kit/uuid';
import type { TemperatureRecord } from '@/lib/brood/temperature/record';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { HttpProblem } from '@/lib/server/http/problem';
import type { TeamScope } from '@/lib/server/queries/team-scope';
import type { Temperature } from '@/models/temperature';

/** A temperature record as stored, without its text. */
export type TemperatureRow = Omit<InferAttributes<Temperature>, 'raw'>;

/** The records of a nest in the order they were kept, those out of force included. */
export async function temperaturesOf({ team, db, transaction }: TeamScope, nest: Buffer): Promise<TemperatureRow[]> {
  return db.models.Temperature.findAll({
    attributes: { exclude: ['raw'] },
    where: { team_id: team, nest_id: nest },
    order: [
      ['kept_at', 'ASC'],
      ['id', 'ASC'],
    ],
    raw: true,
    transaction,
  });
}

/**
 * One record of a nest with its text.
 *
 * @param id as it stands in the address; anything may have been typed there.
 * @throws HttpProblem `not-found` for an unknown id, another nest's or another team's.
 */
export async function temperatureById(
  { team, db, transaction }: TeamScope,
  nest: Buffer,
  id: string,
): Promise<InferAttributes<Temperature>> {
  const find = (own: Buffer) =>
    db.models.Temperature.findOne({ where: { team_id: team, nest_id: nest, id: own }, raw: true, transaction });
  const row = isUuidText(id) ? await find(toBinary(id)) : null;
  if (!row) throw new HttpProblem('not-found');
  return row;
}

/** The values of a record. */
export async function storedRecord(
  { team, db, transaction }: TeamScope,
  { id, kind }: TemperatureRow,
): Promise<TemperatureRecord> {
  const where = { team_id: team, temperature_id: id };
  if (kind === 'logger') {
    const rows = await db.models.TemperatureReading.findAll({ where, order: [['at', 'ASC']], raw: true, transaction });
    return { kind, readings: rows.map(({ at, celsius }) => ({ at: at.getTime(), celsius })) };
  }
  const rows = await db.models.TemperatureDay.findAll({ where, order: [['date', 'ASC']], raw: true, transaction });
  return { kind, days: rows.map(({ date, min_c, max_c }) => ({ date, min: min_c, max: max_c })) };
}
