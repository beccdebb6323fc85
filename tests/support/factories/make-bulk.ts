import { v7 } from 'uuid';
import { spiral } from '@/lib/comb/walk';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import type { TestTeam } from './make-team';

/** Rows of one insert. */
const BATCH = 2_000;
const AT = '2026-06-16T05:41:07.120-04:00';

/** How much a test wants. */
export interface BulkInput {
  nests: number;
  readingsOfANest: number;
  cellsOfAReading: number;
}

interface BulkModel<Row> {
  bulkCreate(rows: Row[]): Promise<unknown>;
}

async function insert<Row>(model: BulkModel<Row>, rows: readonly Row[]): Promise<void> {
  for (let start = 0; start < rows.length; start += BATCH) await model.bulkCreate(rows.slice(start, start + BATCH));
}

/** Code of the nest of a number: `N00000` onwards. */
export function bulkCode(nest: number): string {
  return `N${String(nest).padStart(5, '0')}`;
}

/**
 * Fills an empty team with nests of one visit each, as many field readings at every visit, and as many eggs in every
 * reading: a hundred times faster than one by one.
 */
export async function makeBulk(team: TestTeam, { nests, readingsOfANest, cellsOfAReading }: BulkInput): Promise<void> {
  const { models } = database();
  const own = { team_id: toBinary(team.teamId), opened_by: toBinary(team.members.technician.userId) };
  const opened = { opened_at: new Date(AT), opened_at_text: AT };
  const unplaced = {
    name: null,
    taxon: 'Polistes fuscatus',
    lat: null,
    lon: null,
    accuracy_m: null,
    archived_at: null,
  };
  const sites = Array.from({ length: nests }, (_, index) => ({
    nest: toBinary(v7()),
    visit: toBinary(v7()),
    code: bulkCode(index),
  }));
  const readings = sites.flatMap((site) =>
    Array.from({ length: readingsOfANest }, () => ({ ...site, reading: toBinary(v7()) })),
  );
  await insert(
    models.Nest,
    sites.map(({ nest, code }) => ({ ...own, ...opened, ...unplaced, id: nest, code })),
  );
  const started = { purpose: 'take-down', started_at: new Date(AT), started_at_text: AT, archived_at: null };
  await insert(
    models.Visit,
    sites.map(({ nest, visit }) => ({ ...own, ...started, id: visit, nest_id: nest })),
  );
  const bare = {
    aid: null,
    light: null,
    submitted_at: new Date(AT),
    based_on: null,
    base_seq: null,
    version: null,
    locked_version: null,
  };
  await insert(
    models.Reading,
    readings.map(({ reading, nest, visit }) => ({
      ...own,
      ...opened,
      ...bare,
      id: reading,
      nest_id: nest,
      visit_id: visit,
      kind: 'field',
      source: 'phone',
    })),
  );
  await insertMarks(
    team,
    readings.map(({ reading }) => reading),
    cellsOfAReading,
  );
}

async function insertMarks(team: TestTeam, readings: readonly Buffer[], cells: number): Promise<void> {
  const { Op, Mark, TeamCounter } = database().models;
  const own = { team_id: toBinary(team.teamId) };
  const comb = spiral(cells);
  const marks = readings.flatMap((reading_id) => comb.map((cell) => ({ ...cell, reading_id, op_id: toBinary(v7()) })));
  const actor_id = toBinary(team.members.technician.userId);
  const bareOp = {
    nest_id: null,
    visit_id: null,
    device_id: null,
    op: '{}',
    body_hash: Buffer.alloc(32),
    flags: '',
    received_at: new Date(AT),
  };
  await insert(
    Op,
    marks.map(({ op_id, reading_id }, index) => ({
      ...own,
      ...bareOp,
      op_id,
      reading_id,
      actor_id,
      seq: index + 1,
      kind: 'cell.mark',
      hlc: `1.${index}`,
    })),
  );
  const bareMark = {
    nectar: false,
    unsure: false,
    reused: false,
    scrap: false,
    instar: null,
    note: null,
    supersedes: null,
  };
  await insert(
    Mark,
    marks.map((mark, index) => ({
      ...own,
      ...bareMark,
      ...mark,
      seq: index + 1,
      state: 'egg',
      hlc: `1.${index}`,
      at_text: AT,
    })),
  );
  await TeamCounter.update({ seq: marks.length }, { where: own });
}
