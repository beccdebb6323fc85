import { beforeAll, describe, expect, it } from 'vitest';
import * as exportRoute from '@/app/api/export/[file]/route';
import { cellNumber } from '@/lib/comb/walk';
import { amend, decided, lock, settle } from '@/tests/support/api/decide';
import { downloaded, exportFile } from '@/tests/support/api/download';
import { csvObjects, parseCsv } from '@/tests/support/csv/parse-csv';
import { callApi, problemOf } from '@/tests/support/factories/call-api';
import { makeNest, makeVisit } from '@/tests/support/factories/make-nest';
import { makeMarks, makeReading } from '@/tests/support/factories/make-reading';
import { type TestTeam, makeTeam } from '@/tests/support/factories/make-team';
import { N12, n12Marks } from '@/tests/support/n12';

const FILES = [
  'nests.csv',
  'visits.csv',
  'tallies.csv',
  'cells.csv',
  'settlements.csv',
  'agreement.csv',
  'dictionary.csv',
];
const TALLY_HEADER =
  'team,nest,visit,visit_date,reading,reading_kind,observer,taxon,cells_total,empty,egg,small,medium,large,capped,opened,dead,parasitised,webbed,damaged,unread,nectar_cells,locked_version';
const CELL_HEADER =
  'team,nest,visit,visit_date,reading,reading_kind,observer,cell,q,r,state,instar,nectar,unsure,reused,marked_at,settled_from';

let team: TestTeam;

beforeAll(async () => {
  team = await makeTeam({ name: 'Tarrow, Trust' });
});

/** A nest with one field reading of two cells on one day. */
async function simpleNest(own: TestTeam, nestInput: { code: string; taxon?: string | null }, startedAt: string) {
  const nest = await makeNest(own, nestInput);
  const visit = await makeVisit(own, nest, { startedAt });
  const reading = await makeReading(own, { nest, visit, openedAt: startedAt });
  const opIds = await makeMarks(own, reading, [
    { q: 0, r: -1, state: 'large', unsure: true, at: '2026-06-16T05:42:00.000-04:00' },
    { q: 0, r: 0, state: 'egg', nectar: true, at: '2026-06-16T05:41:00.000-04:00' },
  ]);
  return { nest, visit, reading, opIds };
}

describe('files', () => {
  it('hold every reading, final ones included, byte for byte as the contract says', async () => {
    const own = await makeTeam({ name: 'Byte, for byte' });
    const { nest, visit, reading, opIds } = await simpleNest(own, { code: 'N12' }, '2026-06-16T23:35:00.000-04:00');
    const { reading: final } = await decided(
      await settle(own.members.reviewer, reading, [{ q: 0, r: -1, state: 'capped' }]),
    );
    await lock(own.members.biologist, final);
    const at = `"Byte, for byte",N12,${visit},2026-06-16`;
    expect(await downloaded(own.members.coordinator, 'tallies.csv')).toBe(
      [
        TALLY_HEADER,
        `${at},${reading},field,The technician,Polistes fuscatus,2,0,1,0,0,1,0,0,0,0,0,0,0,1,1`,
        `${at},${final},final,The biologist,Polistes fuscatus,2,0,1,0,0,0,1,0,0,0,0,0,0,1,1`,
        '',
      ].join('\r\n'),
    );
    expect(await downloaded(own.members.coordinator, 'cells.csv')).toBe(
      [
        CELL_HEADER,
        `${at},${reading},field,The technician,0,0,0,egg,,yes,no,no,2026-06-16T05:41:00.000-04:00,`,
        `${at},${reading},field,The technician,1,0,-1,large,,no,yes,no,2026-06-16T05:42:00.000-04:00,`,
        `${at},${final},final,The biologist,0,0,0,egg,,yes,no,no,2026-06-16T05:41:00.000-04:00,`,
        `${at},${final},final,The biologist,1,0,-1,capped,,no,no,no,2026-06-16T05:42:00.000-04:00,${opIds[0]}`,
        '',
      ].join('\r\n'),
    );
    expect(await downloaded(own.members.coordinator, 'visits.csv')).toBe(
      `team,nest,visit,visit_date,purpose,started_at,readings\r\n${at},take-down,2026-06-16T23:35:00.000-04:00,2\r\n`,
    );
    expect(await downloaded(own.members.coordinator, 'nests.csv')).toBe(
      `team,nest,nest_id,name,taxon,lat,lon,accuracy_m,opened_at\r\n"Byte, for byte",N12,${nest},,Polistes fuscatus,,,,2026-06-14T09:00:00.000-04:00\r\n`,
    );
  });

  it('come as attachments in UTF-8, not to be kept or guessed at', async () => {
    for (const file of FILES) {
      const response = await exportFile(team.members.researcher, file);
      const { headers } = response;
      expect(response.status).toBe(200);
      expect(headers.get('content-type')).toBe('text/csv; charset=utf-8');
      expect(headers.get('content-disposition')).toBe(`attachment; filename="${file}"`);
      expect([headers.get('cache-control'), headers.get('x-content-type-options')]).toEqual(['no-store', 'nosniff']);
      await response.body?.cancel();
    }
  });

  it('answer HEAD without a body', async () => {
    const response = await callApi(exportRoute, 'HEAD', { as: team.members.researcher, params: { file: 'cells.csv' } });
    expect([response.status, await response.text()]).toEqual([200, '']);
  });

  it('keep two readings of one visit apart, in the order nest, visit, reading, cell', async () => {
    const own = await makeTeam({ name: 'Two readers' });
    const nest = await makeNest(own, { code: 'N12' });
    const other = await makeNest(own, { code: 'N02' });
    const late = await makeVisit(own, nest, { startedAt: '2026-06-20T06:00:00.000-04:00' });
    const early = await makeVisit(own, nest, { startedAt: '2026-06-16T06:00:00.000-04:00' });
    const mark = n12Marks('field');
    const third = await makeReading(own, { nest, visit: late, openedAt: '2026-06-20T06:10:00.000-04:00', marks: mark });
    const second = await makeReading(own, {
      nest,
      visit: early,
      kind: 'second',
      openedAt: '2026-06-18T09:00:00.000-04:00',
      marks: n12Marks('blind'),
    });
    const first = await makeReading(own, {
      nest,
      visit: early,
      openedAt: '2026-06-16T06:10:00.000-04:00',
      marks: [...mark].reverse(),
    });
    const zeroth = await makeReading(own, {
      nest: other,
      visit: await makeVisit(own, other, { startedAt: '2026-07-01T06:00:00.000-04:00' }),
    });
    const tallies = csvObjects(await downloaded(own.members.reviewer, 'tallies.csv'));
    expect(tallies.map((row) => row.reading)).toEqual([zeroth, first, second, third]);
    const cells = csvObjects(await downloaded(own.members.reviewer, 'cells.csv'));
    expect(cells.map((row) => row.reading)).toEqual([first, second, third].flatMap((id) => N12.map(() => id)));
    expect(cells.slice(0, 33).map((row) => Number(row.cell))).toEqual(N12.map(({ cell }) => cell));
    for (const row of cells) expect(Number(row.cell)).toBe(cellNumber({ q: Number(row.q), r: Number(row.r) }));
    expect(
      tallies
        .map((row) => [row.capped, row.parasitised, row.large, row.medium, row.small, row.egg, row.empty])
        .slice(1, 3),
    ).toEqual([
      ['6', '1', '6', '4', '6', '9', '1'],
      ['7', '0', '7', '4', '5', '10', '0'],
    ]);
  });

  it('show a locked version until the next one is locked, so that the number fits the cells', async () => {
    const own = await makeTeam({ name: 'Amenders' });
    const { reading } = await simpleNest(own, { code: 'N12' }, '2026-06-16T05:35:00.000-04:00');
    const { reviewer, researcher } = own.members;
    const final = async () => {
      const rows = csvObjects(await downloaded(researcher, 'tallies.csv'));
      const row = rows.find((candidate) => candidate.reading_kind === 'final');
      return [row?.capped, row?.dead, row?.locked_version];
    };
    await settle(reviewer, reading, [{ q: 0, r: -1, state: 'capped' }]);
    expect(await final()).toEqual(['1', '0', '']);
    await lock(reviewer, reading);
    expect(await final()).toEqual(['1', '0', '1']);
    await amend(reviewer, reading);
    await settle(reviewer, reading, [{ q: 0, r: -1, state: 'dead' }]);
    expect(await final()).toEqual(['1', '0', '1']);
    await lock(reviewer, reading);
    expect(await final()).toEqual(['0', '1', '2']);
  });

  it('are the same bytes however often they are asked for', async () => {
    for (const file of FILES) {
      const [one, two, three] = await Promise.all([1, 2, 3].map(() => downloaded(team.members.reviewer, file)));
      expect(two).toBe(one);
      expect(three).toBe(one);
    }
  });

  it('leave out what a blind second reader must not see', async () => {
    const own = await makeTeam({ name: 'Blind' });
    const { nest, visit, reading } = await simpleNest(own, { code: 'N12' }, '2026-06-16T05:35:00.000-04:00');
    await lock(own.members.biologist, reading);
    const second = await makeReading(own, {
      nest,
      visit,
      kind: 'second',
      submittedAt: null,
      marks: [{ q: 0, r: 0, state: 'dead' }],
    });
    for (const file of ['tallies.csv', 'cells.csv']) {
      const seen = (text: string) => new Set(csvObjects(text).map((row) => row.reading));
      expect(seen(await downloaded(own.members.reviewer, file))).toEqual(new Set([second]));
      expect(seen(await downloaded(own.members.biologist, file)).size).toBe(3);
    }
  });

  it('round every place for a researcher, towards south and west, and leave the accuracy out', async () => {
    const own = await makeTeam({ name: 'Places' });
    await makeNest(own, { code: 'A', place: { lat: 43.5785, lon: -77.5985, accuracyM: 3.5 } });
    await makeNest(own, { code: 'B', place: { lat: -0.001, lon: 0.019, accuracyM: null } });
    await makeNest(own, { code: 'C', place: { lat: 43.58, lon: -77.6, accuracyM: 12 } });
    const places = (text: string) => csvObjects(text).map(({ lat, lon, accuracy_m }) => [lat, lon, accuracy_m]);
    expect(places(await downloaded(own.members.coordinator, 'nests.csv'))).toEqual([
      ['43.5785', '-77.5985', '3.5'],
      ['-0.001', '0.019', ''],
      ['43.58', '-77.6', '12'],
    ]);
    expect(places(await downloaded(own.members.researcher, 'nests.csv'))).toEqual([
      ['43.57', '-77.6', ''],
      ['-0.01', '0.01', ''],
      ['43.58', '-77.6', ''],
    ]);
  });
});

describe('the spreadsheet form', () => {
  const evil = '=HYPERLINK("http://x.example";"y")';

  it('guards what people typed and nothing else; the exact form changes no character', async () => {
    const own = await makeTeam({ name: '@team', canary: '' });
    const nest = await makeNest(own, {
      code: '-1+2',
      name: evil,
      taxon: '\uff1dSUM(1)',
      place: { lat: -43.5, lon: -77.25 },
    });
    const visit = await makeVisit(own, nest);
    await makeReading(own, { nest, visit, marks: [{ q: -1, r: 0, state: 'egg' }] });
    const exact = csvObjects(await downloaded(own.members.coordinator, 'nests.csv'));
    expect(exact).toMatchObject([
      { team: '@team', nest: '-1+2', name: evil, taxon: '\uff1dSUM(1)', lat: '-43.5', lon: '-77.25' },
    ]);
    const text = await downloaded(own.members.coordinator, 'nests.csv', 'for=spreadsheet');
    expect(text.startsWith('\ufeffteam,nest,')).toBe(true);
    expect(csvObjects(text)).toMatchObject([
      { team: "'@team", nest: "'-1+2", name: `'${evil}`, taxon: "'\uff1dSUM(1)", lat: '-43.5', lon: '-77.25' },
    ]);
    const cells = csvObjects(await downloaded(own.members.coordinator, 'cells.csv', 'for=spreadsheet'));
    expect(cells).toMatchObject([{ nest: "'-1+2", q: '-1', r: '0', state: 'egg' }]);
    expect((await downloaded(own.members.coordinator, 'cells.csv')).startsWith('team,')).toBe(true);
  });

  it('reads back field by field, in both forms, whatever a name holds', async () => {
    const own = await makeTeam({ name: 'Nasty' });
    const names = [
      'a,b',
      'say "so"',
      'two\nlines',
      'a;b',
      '\ttab',
      "'",
      '<script>alert(1)</script>',
      '👩\u200d🔬 e\u0301\u202e',
      '',
      ' ',
    ];
    for (const [index, name] of names.entries()) await makeNest(own, { code: `N${index}`, name });
    expect(csvObjects(await downloaded(own.members.coordinator, 'nests.csv')).map((row) => row.name)).toEqual(names);
    const guarded = csvObjects(await downloaded(own.members.coordinator, 'nests.csv', 'for=spreadsheet')).map(
      (row) => row.name,
    );
    expect(guarded).toEqual(names.map((name) => (name.startsWith('\t') ? `'${name}` : name)));
  });
});

describe('filters', () => {
  let own: TestTeam;

  beforeAll(async () => {
    own = await makeTeam({ name: 'Filtered' });
    await simpleNest(own, { code: 'N01' }, '2026-05-21T23:59:00.000-04:00');
    await simpleNest(own, { code: 'N02', taxon: 'Polistes metricus' }, '2026-05-22T00:00:00.000-04:00');
    await simpleNest(own, { code: 'N03', taxon: null }, '2026-05-23T12:00:00.000-04:00');
    await simpleNest(own, { code: 'N01', taxon: 'Polistes metricus' }, '2026-05-24T12:00:00.000-04:00');
  });

  it.each([
    ['', ['N01', 'N01', 'N02', 'N03']],
    ['nest=N01', ['N01', 'N01']],
    ['nest=N02', ['N02']],
    ['taxon=Polistes metricus', ['N01', 'N02']],
    ['taxon=Polistes', []],
    ['nest=N01&taxon=Polistes fuscatus', ['N01']],
    ['from=2026-05-22', ['N01', 'N02', 'N03']],
    ['to=2026-05-22', ['N01', 'N02']],
    ['from=2026-05-22&to=2026-05-23', ['N02', 'N03']],
    ['from=2026-05-21&to=2026-05-21', ['N01']],
    ['from=2026-05-25', []],
    ['from=2026-05-23&to=2026-05-22', []],
    ['nest=&taxon=&from=&to=&for=exact', ['N01', 'N01', 'N02', 'N03']],
  ])('?%s gives %j in every file', async (query, codes) => {
    for (const file of ['tallies.csv', 'visits.csv', 'nests.csv']) {
      const rows = csvObjects(await downloaded(own.members.reviewer, file, query.replaceAll(' ', '%20')));
      expect(rows.map((row) => row.nest)).toEqual(codes);
    }
    const cells = csvObjects(await downloaded(own.members.reviewer, 'cells.csv', query.replaceAll(' ', '%20')));
    expect(cells.map((row) => row.nest)).toEqual(codes.flatMap((code) => [code, code]));
  });

  it.each([
    ['nest=N99', 404, 'not-found'],
    ['nest=n01', 404, 'not-found'],
    ['nest=N01%20', 404, 'not-found'],
    ['nest=N0_', 404, 'not-found'],
    ["nest=' OR 1=1--", 404, 'not-found'],
    ['from=2026-02-30', 400, 'param'],
    ['to=yesterday', 400, 'param'],
    ['from=2026-05-22T00:00:00Z', 400, 'param'],
    ['for=html', 400, 'param'],
    ['format=xlsx', 400, 'param'],
    ['nest[]=N01', 400, 'param'],
    ['nest=N01&nest=N02', 400, 'dup-param'],
  ])('?%s is answered %d %s', async (query, status, code) => {
    expect(await problemOf(await exportFile(own.members.reviewer, 'cells.csv', query))).toEqual([status, code]);
  });

  it.each(['photos.csv', 'cells', 'cells.CSV', 'cells.csv/..', '__proto__', 'constructor', ''])(
    'there is no file %j',
    async (file) => {
      expect(await problemOf(await exportFile(own.members.reviewer, file))).toEqual([404, 'not-found']);
    },
  );

  it('is for everybody but technicians, and for nobody who is not signed in', async () => {
    for (const file of [...FILES, 'photos.csv']) {
      expect(await problemOf(await exportFile(own.members.technician, file))).toEqual([403, 'role']);
      expect(await problemOf(await exportFile(null, file))).toEqual([401, 'signin']);
    }
  });
});

it('gives a dictionary that names every header of the other files', async () => {
  const dictionary = csvObjects(await downloaded(team.members.researcher, 'dictionary.csv'));
  for (const file of FILES) {
    const [header] = parseCsv(await downloaded(team.members.researcher, file));
    expect(dictionary.filter((row) => row.file === file).map((row) => row.name)).toEqual(header);
  }
});
