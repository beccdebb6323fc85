import 'server-only';
import { createHash } from 'node:crypto';
import { parseTemperatureCsv, recordSize } from '@/lib/brood/temperature/csv/parse-temperature-csv';
import type { TemperatureRecord } from '@/lib/brood/temperature/record';
import { addDays } from '@/lib/kit/local-date';
import { startOfLocalDay } from '@/lib/kit/start-of-local-day';
import type { TeamContext } from '@/lib/server/auth/team-context';
import { auditedWrite } from '@/lib/server/commands/audited-write';
import { newId } from '@/lib/server/db/new-id';
import { storedDate } from '@/lib/server/db/stored-date';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { HttpProblem } from '@/lib/server/http/problem';
import { nestById } from '@/lib/server/queries/nest-rows';
import type { TeamScope } from '@/lib/server/queries/team-scope';
import { temperaturesOf } from '@/lib/server/queries/temperature/temperature-rows';
import { takeOut } from './remove-temperature';
import type { KeepInput } from './temperature-input';

/** Rows written in one statement. */
const BATCH = 2_000;

/** A record ready to be written. */
interface Prepared {
  record: TemperatureRecord;
  source: 'file' | 'hand';
  fileName: string | null;
  raw: string;
  hash: Buffer;
  answers: string;
}

function recordOf(input: KeepInput, zone: string): TemperatureRecord {
  if ('days' in input) return { kind: 'daily', days: input.days };
  const parsed = parseTemperatureCsv(input.text, zone, input.answers);
  if (parsed.kind === 'read') return parsed.record;
  const detail =
    parsed.kind === 'unreadable' ? parsed.reason : parsed.questions.map((question) => question.text).join(' ');
  throw new HttpProblem('temperature-file', { members: { detail } });
}

/** Reads what came; the text it came as is what is kept. @throws HttpProblem `temperature-file` */
function prepare(input: KeepInput, zone: string): Prepared {
  const raw = 'days' in input ? JSON.stringify(input.days) : input.text;
  return {
    record: recordOf(input, zone),
    source: 'days' in input ? 'hand' : 'file',
    fileName: 'days' in input ? null : (input.fileName ?? null),
    raw,
    hash: createHash('sha256').update(raw, 'utf8').digest(),
    answers: JSON.stringify('days' in input ? {} : (input.answers ?? {})),
  };
}

/** First and last instant that a record speaks for. */
function spanOf(record: TemperatureRecord, zone: string): { from_at: Date; to_at: Date } {
  if (record.kind === 'logger') {
    const [from = 0, to = 0] = [record.readings[0]?.at, record.readings.at(-1)?.at];
    return { from_at: storedDate(from), to_at: storedDate(to) };
  }
  const dates = record.days.map(({ date }) => date).sort();
  const [first = '', last = ''] = [dates[0], dates.at(-1)];
  return {
    from_at: storedDate(startOfLocalDay(first, zone)),
    to_at: storedDate(startOfLocalDay(addDays(last, 1), zone)),
  };
}

async function inBatches<Row>(rows: readonly Row[], write: (batch: Row[]) => Promise<unknown>): Promise<void> {
  for (let i = 0; i < rows.length; i += BATCH) await write(rows.slice(i, i + BATCH));
}

async function writeValues({ team, db, transaction }: TeamScope, id: Buffer, record: TemperatureRecord): Promise<void> {
  const key = { team_id: team, temperature_id: id };
  if (record.kind === 'logger') {
    const rows = record.readings.map(({ at, celsius }) => ({ ...key, at: storedDate(at), celsius }));
    await inBatches(rows, (batch) => db.models.TemperatureReading.bulkCreate(batch, { transaction }));
    return;
  }
  const rows = record.days.map(({ date, min, max }) => ({ ...key, date, min_c: min, max_c: max }));
  await inBatches(rows, (batch) => db.models.TemperatureDay.bulkCreate(batch, { transaction }));
}

async function refuseTwice(scope: TeamScope, nest: Buffer, hash: Buffer): Promise<void> {
  const rows = await temperaturesOf(scope, nest);
  if (rows.some(({ raw_hash, removed_at }) => removed_at === null && raw_hash.equals(hash))) {
    throw new HttpProblem('temperature-kept');
  }
}

async function writeRecord(
  scope: TeamScope,
  prepared: Prepared,
  row: { nest: Buffer; id: Buffer; at: Date; zone: string },
) {
  const { record, source, fileName, raw, hash, answers } = prepared;
  await scope.db.models.Temperature.create(
    {
      ...{ team_id: scope.team, id: row.id, nest_id: row.nest, kind: record.kind, source, raw, answers },
      file_name: fileName,
      raw_hash: hash,
      size: recordSize(record),
      ...spanOf(record, row.zone),
      ...{ kept_by: scope.user, kept_at: row.at, removed_by: null, removed_at: null, removed_reason: null },
    },
    { transaction: scope.transaction },
  );
  await writeValues(scope, row.id, record);
}

/**
 * Keeps a temperature record of a nest: the text as it came with its hash, and the values read from it. A record it
 * replaces stays, out of force.
 *
 * @param nowMs epoch milliseconds.
 * @throws HttpProblem `not-found`, `temperature-file` for a file that cannot be read without an answer,
 *   `temperature-kept` when the same text is in force already, `temperature-removed` for a record replaced twice.
 */
export async function keepTemperature(
  ctx: TeamContext,
  { id, input }: { id: string; input: KeepInput },
  nowMs: number,
): Promise<{ id: string; size: number }> {
  const prepared = prepare(input, ctx.zone);
  const kept = newId();
  return auditedWrite(ctx, nowMs, async (scope) => {
    const nest = await nestById(scope, id);
    const replaced = input.replaces ? [await takeOut(scope, nest.id, { ...input.replaces, nowMs })] : [];
    await refuseTwice(scope, nest.id, prepared.hash);
    await writeRecord(scope, prepared, { nest: nest.id, id: toBinary(kept), at: new Date(nowMs), zone: ctx.zone });
    const size = recordSize(prepared.record);
    const detail = { nest: id, kind: prepared.record.kind, size, hash: prepared.hash.toString('hex') };
    return {
      result: { id: kept, size },
      events: [...replaced, { action: 'temperature.keep', subjectId: kept, detail }],
    };
  });
}
