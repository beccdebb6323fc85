import { setTimeout as sleep } from 'node:timers/promises';
import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { database } from '@/lib/server/db/database';
import { toBinary } from '@/lib/server/db/uuid-binary';
import { exportDatabase } from '@/lib/server/export/export-database';
import { downloaded, exportFile } from '@/tests/support/api/download';
import { expectConsole } from '@/tests/support/console-guard';
import { csvObjects } from '@/tests/support/csv/parse-csv';
import { bulkCode, makeBulk } from '@/tests/support/factories/make-bulk';
import { makeNest, makeVisit } from '@/tests/support/factories/make-nest';
import { makeReading } from '@/tests/support/factories/make-reading';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';

const ROWS = process.env.LONG === '1' ? 100_000 : 20_000;
const CELLS = 50;
const READINGS = ROWS / CELLS;
const READINGS_OF_A_NEST = 4;

let team: TestTeam;

beforeAll(async () => {
  team = await makeTeam();
  await makeBulk(team, {
    nests: READINGS / READINGS_OF_A_NEST,
    readingsOfANest: READINGS_OF_A_NEST,
    cellsOfAReading: CELLS,
  });
}, 600_000);

afterAll(() => exportDatabase().sequelize.close());

/** Counts the statements of downloads from now on. */
function countStatements(): { count: number } {
  const spy = vi.spyOn(exportDatabase().sequelize, 'query');
  const before = spy.mock.calls.length;
  return {
    get count() {
      return spy.mock.calls.length - before;
    },
  };
}

describe(`a download of ${ROWS} cells`, () => {
  it('is whole, with no row twice, and holds no more than a few pages in memory', async () => {
    const response = await exportFile(team.members.researcher, 'cells.csv');
    const reader = response.body?.getReader();
    if (!reader) throw new Error('the download has no body');
    globalThis.gc?.();
    const before = process.memoryUsage().rss;
    let peak = before;
    let lines = 0;
    const seen = new Set<string>();
    let rest = '';
    const decoder = new TextDecoder();
    for (let part = await reader.read(); !part.done; part = await reader.read()) {
      const text = rest + decoder.decode(part.value, { stream: true });
      const rows = text.split('\r\n');
      rest = rows.pop() ?? '';
      lines += rows.length;
      for (const row of rows) seen.add(row.split(',')[4] ?? '');
      peak = Math.max(peak, process.memoryUsage().rss);
    }
    expect(rest).toBe('');
    expect(lines).toBe(ROWS + 1);
    expect(seen.size).toBe(READINGS + 1);
    expect((peak - before) / 2 ** 20).toBeLessThan(120);
  });

  it('is read from the database no faster than it is taken', async () => {
    const counter = countStatements();
    const response = await exportFile(team.members.researcher, 'cells.csv');
    const reader = response.body?.getReader();
    await reader?.read();
    await sleep(300);
    const early = counter.count;
    await sleep(300);
    expect(counter.count).toBe(early);
    await readToEnd(reader);
    expect(counter.count).toBeGreaterThan(2 * early);
  });

  it('shows one moment, whatever is recorded while it runs', async () => {
    const response = await exportFile(team.members.researcher, 'tallies.csv');
    const reader = response.body?.getReader();
    const parts = [(await reader?.read())?.value];
    const nest = await makeNest(team, { code: 'Z-late' });
    await makeReading(team, { nest, visit: await makeVisit(team, nest), marks: [{ q: 0, r: 0, state: 'egg' }] });
    const last = { team_id: toBinary(team.teamId), code: bulkCode(READINGS / READINGS_OF_A_NEST - 1) };
    await database().models.Nest.update({ taxon: 'Polistes changed' }, { where: last });
    for (let part = await reader?.read(); part && !part.done; part = await reader?.read()) parts.push(part.value);
    const text = Buffer.concat(parts.map((part) => part ?? new Uint8Array())).toString('utf8');
    expect(csvObjects(text)).toHaveLength(READINGS);
    expect(text).not.toContain('Z-late');
    expect(text).not.toContain('Polistes changed');
    const after = await downloaded(team.members.researcher, 'tallies.csv');
    expect(after).toContain('Z-late');
    expect(after).toContain('Polistes changed');
  });

  it('stops when the reader goes away, and gives its connection back', async () => {
    for (let i = 0; i < 6; i++) {
      const response = await exportFile(team.members.researcher, 'cells.csv');
      const reader = response.body?.getReader();
      if (i % 2 === 0) await reader?.read();
      await reader?.cancel();
    }
    const counter = countStatements();
    await sleep(200);
    expect(counter.count).toBe(0);
    const started = performance.now();
    await downloaded(team.members.researcher, 'cells.csv', 'nest=N00001');
    expect(performance.now() - started).toBeLessThan(5_000);
  });

  it('fails where the database does, instead of looking whole', async () => {
    const response = await exportFile(team.members.researcher, 'cells.csv');
    const reader = response.body?.getReader();
    await reader?.read();
    expectConsole('warn', /^Rolling back transaction/);
    const logged = vi.spyOn(process.stderr, 'write').mockReturnValue(true);
    await killConnections();
    await expect(readToEnd(reader)).rejects.toThrow();
    expect(String(logged.mock.calls[0]?.[0])).toContain('"event":"export-failed"');
    logged.mockRestore();
    expect(csvObjects(await downloaded(team.members.researcher, 'nests.csv', 'nest=N00001'))).toHaveLength(1);
  });
});

async function readToEnd(reader: ReadableStreamDefaultReader<Uint8Array> | undefined): Promise<void> {
  while (reader && !(await reader.read()).done);
}

/** Ends every connection to this test's database but the one that asks. */
async function killConnections(): Promise<void> {
  const { sequelize } = database();
  const rows = await sequelize.query<{ id: number }>(
    'SELECT id FROM information_schema.processlist WHERE db = DATABASE() AND id <> CONNECTION_ID()',
    { type: QueryTypes.SELECT },
  );
  for (const { id } of rows) await sequelize.query(`KILL CONNECTION ${Number(id)}`);
}
