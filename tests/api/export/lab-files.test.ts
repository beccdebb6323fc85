import { beforeAll, describe, expect, it } from 'vitest';
import * as countsRoute from '@/app/api/export/counts/route';
import { EXPORT_FILES } from '@/lib/server/export/file-lines';
import { amend, decided, lock, settle } from '@/tests/support/api/decide';
import { downloaded, exportFile } from '@/tests/support/api/download';
import { csvObjects, parseCsv } from '@/tests/support/csv/parse-csv';
import { callApi, problemOf } from '@/tests/support/factories/call-api';
import { makeNest, makeVisit } from '@/tests/support/factories/make-nest';
import { makeReading } from '@/tests/support/factories/make-reading';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';
import { n12Decisions, n12Marks } from '@/tests/support/n12';
import { readZip } from '@/tests/support/zip/read-zip';

const SETTLEMENT_HEADER =
  'team,nest,visit,visit_date,reading,source_reading,cell,q,r,field_state,lab_state,state,reason,settled_by,settled_at,version,settled_from,locked_version';
const AGREEMENT_HEADER =
  'team,nest,visit,visit_date,comparison,first_reading,first_observer,second_reading,second_observer,cells_compared,cells_unread,cells_only_first,cells_only_second,cells_agreed,raw,raw_low,raw_high,kappa,kappa_low,kappa_high,cells_stages,kappa_linear,kappa_quadratic,alpha_nominal,alpha_ordinal';

/** N12 read at the nest and blind in the lab. */
async function makeN12(team: TestTeam, code = 'N12') {
  const nest = await makeNest(team, { code });
  const visit = await makeVisit(team, nest);
  const field = await makeReading(team, { nest, visit, marks: n12Marks('field') });
  const openedAt = '2026-06-18T10:05:00.000-04:00';
  const blind = await makeReading(team, { nest, visit, kind: 'second', openedAt, marks: n12Marks('blind') });
  return { nest, visit, field, blind };
}

const N12_DECISIONS = n12Decisions((cell) => (cell === 6 ? '=a pierced cap' : 'The photo shows it.'));

let team: TestTeam;

beforeAll(async () => {
  team = await makeTeam();
  const { field } = await makeN12(team);
  await decided(await settle(team.members.biologist, field, N12_DECISIONS));
  await decided(await lock(team.members.biologist, field));
});

describe('settlements.csv', () => {
  it('holds each decision with both states before it, the reason and the version', async () => {
    const text = await downloaded(team.members.coordinator, 'settlements.csv');
    expect(text.split('\r\n')[0]).toBe(SETTLEMENT_HEADER);
    const rows = csvObjects(text);
    expect(rows.map(({ cell }) => cell)).toEqual(['6', '13', '17', '32']);
    expect([rows[0], rows[3]]).toMatchObject([
      {
        cell: '6',
        field_state: 'parasitised',
        lab_state: 'capped',
        state: 'parasitised',
        reason: '=a pierced cap',
        settled_by: 'The biologist',
        version: '1',
        locked_version: '1',
      },
      { cell: '32', field_state: 'empty', lab_state: 'egg', state: 'egg' },
    ]);
  });

  it('holds what was locked while a new version is worked on', async () => {
    const own = await makeTeam();
    const nest = await makeNest(own);
    const visit = await makeVisit(own, nest);
    const field = await makeReading(own, { nest, visit, marks: n12Marks('field') });
    await settle(own.members.reviewer, field, [{ q: 0, r: 0, state: 'dead' }]);
    await lock(own.members.reviewer, field);
    await amend(own.members.reviewer, field);
    await settle(own.members.reviewer, field, [{ q: 0, r: 0, state: 'egg' }]);
    const states = async () =>
      csvObjects(await downloaded(own.members.reviewer, 'settlements.csv')).map((row) => row.state);
    expect(await states()).toEqual(['dead']);
    await lock(own.members.reviewer, field);
    expect(await states()).toEqual(['dead', 'egg']);
  });
});

describe('agreement.csv', () => {
  it('gives N12 29 of 33 = 0.8788 and kappa 0.8481 (counted by hand)', async () => {
    const text = await downloaded(team.members.researcher, 'agreement.csv');
    expect(text.split('\r\n')[0]).toBe(AGREEMENT_HEADER);
    const [row, ...more] = csvObjects(text);
    expect(more).toEqual([]);
    expect(row).toMatchObject({ comparison: 'field-lab', cells_compared: '33', cells_agreed: '29', cells_unread: '0' });
    expect([Number(row?.raw).toFixed(4), Number(row?.kappa).toFixed(4), row?.kappa_low]).toEqual([
      '0.8788',
      '0.8481',
      '',
    ]);
    expect([row?.first_observer, row?.second_observer]).toEqual(['The technician', 'The reviewer']);
  });

  it('compares every further reading: a second phone, another reader, the same reader again', async () => {
    const own = await makeTeam();
    const { nest, visit, field, blind } = await makeN12(own);
    const { technician2, reviewer, reviewer2 } = own.members;
    const late = { nest, visit, marks: n12Marks('final') };
    await makeReading(own, { ...late, by: technician2.userId, openedAt: '2026-06-16T05:50:00.000-04:00' });
    await makeReading(own, {
      ...late,
      kind: 'second',
      by: reviewer2.userId,
      openedAt: '2026-07-02T09:00:00.000-04:00',
    });
    await makeReading(own, { ...late, kind: 'second', by: reviewer.userId, openedAt: '2026-07-03T09:00:00.000-04:00' });
    await decided(await settle(own.members.biologist, field, N12_DECISIONS));
    await decided(await lock(own.members.biologist, field));
    const rows = csvObjects(await downloaded(own.members.reviewer, 'agreement.csv'));
    expect(rows.map((row) => [row.comparison, row.first_reading, row.second_observer])).toEqual([
      ['field-field', field, 'Another technician'],
      ['field-lab', field, 'The reviewer'],
      ['other-reader', blind, 'Another reviewer'],
      ['same-reader', blind, 'The reviewer'],
    ]);
  });

  it('leaves a reading out that is not handed in yet', async () => {
    const own = await makeTeam();
    const nest = await makeNest(own);
    const visit = await makeVisit(own, nest);
    await makeReading(own, { nest, visit, submittedAt: null, marks: n12Marks('field') });
    await makeReading(own, { nest, visit, kind: 'second', marks: n12Marks('blind') });
    expect(csvObjects(await downloaded(own.members.coordinator, 'agreement.csv'))).toEqual([]);
  });
});

describe('a second reader who has not finished', () => {
  it('gets no figure of that visit: no agreement, no decision, no count of them', async () => {
    const own = await makeTeam();
    const { nest, visit, field } = await makeN12(own);
    await decided(await settle(own.members.biologist, field, [{ q: 0, r: 0, state: 'dead' }]));
    const { reviewer2, biologist } = own.members;
    await makeReading(own, { nest, visit, kind: 'second', by: reviewer2.userId, submittedAt: null });
    for (const file of ['agreement.csv', 'settlements.csv']) {
      expect(csvObjects(await downloaded(reviewer2, file))).toEqual([]);
      expect(csvObjects(await downloaded(biologist, file)).length).toBe(1);
    }
    const counts = (await (await callApi(countsRoute, 'GET', { as: reviewer2 })).json()) as { rows: object };
    expect(counts.rows).toMatchObject({ 'agreement.csv': 0, 'settlements.csv': 0, 'tallies.csv': 1, 'cells.csv': 0 });
  });
});

describe('everything.zip', () => {
  it('holds every file, byte for byte as it is downloaded alone, dictionary included', async () => {
    const response = await exportFile(team.members.researcher, 'everything.zip');
    expect(response.headers.get('content-type')).toBe('application/zip');
    expect(response.headers.get('content-disposition')).toBe('attachment; filename="everything.zip"');
    const files = readZip(Buffer.from(await response.arrayBuffer()));
    expect([...files.keys()]).toEqual([...EXPORT_FILES.keys()]);
    for (const [name, text] of files) expect(text).toBe(await downloaded(team.members.researcher, name));
  });

  it('takes the filters and the form of the files', async () => {
    const query = 'nest=N12&for=spreadsheet';
    const response = await exportFile(team.members.coordinator, 'everything.zip', query);
    const files = readZip(Buffer.from(await response.arrayBuffer()));
    expect(files.get('settlements.csv')).toBe(await downloaded(team.members.coordinator, 'settlements.csv', query));
    expect(await problemOf(await exportFile(team.members.coordinator, 'everything.zip', 'nest=N99'))).toEqual([
      404,
      'not-found',
    ]);
  });

  it('gives its connection back when the reader goes away, and again and again', async () => {
    for (let time = 0; time < 12; time += 1) {
      const response = await exportFile(team.members.coordinator, 'everything.zip');
      await response.body?.cancel();
    }
    expect(await downloaded(team.members.coordinator, 'nests.csv')).toContain('N12');
  });
});

describe('row counts', () => {
  it('are those of the files as downloaded', async () => {
    const response = await callApi(countsRoute, 'GET', { as: team.members.coordinator, query: 'nest=N12' });
    const { rows } = (await response.json()) as { rows: Record<string, number> };
    expect(Object.keys(rows)).toEqual([...EXPORT_FILES.keys()]);
    for (const [name, count] of Object.entries(rows)) {
      expect(count).toBe(csvObjects(await downloaded(team.members.coordinator, name, 'nest=N12')).length);
    }
  });
});

describe('the spreadsheet form of every file', () => {
  it('has no field that a spreadsheet would take for a formula, but numbers', async () => {
    for (const name of EXPORT_FILES.keys()) {
      const fields = parseCsv((await downloaded(team.members.coordinator, name, 'for=spreadsheet')).slice(1)).flat();
      expect(fields.filter((field) => /^[=+\-@\t\r]/.test(field) && !/^-\d+(\.\d+)?$/.test(field))).toEqual([]);
    }
    const [settled] = csvObjects(await downloaded(team.members.coordinator, 'settlements.csv', 'for=spreadsheet'));
    expect(settled?.reason).toBe("'=a pierced cap");
  });
});
