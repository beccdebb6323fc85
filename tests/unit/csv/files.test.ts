import { describe, expect, it } from 'vitest';
import { CELL_STATES } from '@/lib/comb/states';
import { emptyTally } from '@/lib/comb/tally';
import { AGREEMENT_FILE } from '@/lib/csv/agreement-file';
import { CELLS_FILE, type CellRow } from '@/lib/csv/cells-file';
import { DICTIONARY_FILE, dictionaryRows } from '@/lib/csv/dictionary-file';
import { NESTS_FILE } from '@/lib/csv/nests-file';
import { SETTLEMENTS_FILE } from '@/lib/csv/settlements-file';
import { TALLIES_FILE, type TallyRow } from '@/lib/csv/tallies-file';
import { VISITS_FILE } from '@/lib/csv/visits-file';
import { writeHeader, writeRow } from '@/lib/csv/write-row';
import { csvObjects } from '@/tests/support/csv/parse-csv';

const KEY = {
  team: 'Tarrow',
  nest: 'N12',
  visit: '01890000-0000-7000-8000-000000000002',
  visitDate: '2026-06-16',
  reading: '01890000-0000-7000-8000-000000000003',
  readingKind: 'field',
  observer: 'Senna Vautry',
};

const CELL: CellRow = {
  ...KEY,
  cell: 6,
  q: -1,
  r: 0,
  state: 'parasitised',
  instar: null,
  nectar: false,
  unsure: true,
  reused: false,
  markedAt: '2026-06-16T05:41:07.120-04:00',
  settledFrom: null,
};

const FILES = [NESTS_FILE, VISITS_FILE, TALLIES_FILE, CELLS_FILE, SETTLEMENTS_FILE, AGREEMENT_FILE, DICTIONARY_FILE];

describe('column registries', () => {
  it.each([
    [NESTS_FILE, 'team,nest,nest_id,name,taxon,lat,lon,accuracy_m,opened_at'],
    [VISITS_FILE, 'team,nest,visit,visit_date,purpose,started_at,readings'],
    [
      TALLIES_FILE,
      'team,nest,visit,visit_date,reading,reading_kind,observer,taxon,cells_total,empty,egg,small,medium,large,capped,opened,dead,parasitised,webbed,damaged,unread,nectar_cells,locked_version',
    ],
    [
      CELLS_FILE,
      'team,nest,visit,visit_date,reading,reading_kind,observer,cell,q,r,state,instar,nectar,unsure,reused,marked_at,settled_from',
    ],
    [DICTIONARY_FILE, 'file,name,label,unit,type,allowed_values,required,blank_means,since'],
  ])('$name has the columns of the contract in their order', (file, names) => {
    expect(writeHeader<never>(file, 'exact')).toBe(`${names}\r\n`);
  });

  it('writes a cell row value for value', () => {
    expect(writeRow(CELLS_FILE, CELL, 'exact')).toBe(
      `Tarrow,N12,${KEY.visit},2026-06-16,${KEY.reading},field,Senna Vautry,6,-1,0,parasitised,,no,yes,no,2026-06-16T05:41:07.120-04:00,\r\n`,
    );
  });

  it('keeps negative addresses numbers in the spreadsheet form', () => {
    expect(writeRow(CELLS_FILE, CELL, 'spreadsheet')).toContain(',6,-1,0,');
  });

  it('writes each count of a tally under its own name', () => {
    const counts = emptyTally();
    CELL_STATES.forEach((state, index) => (counts[state] = index + 1));
    const row: TallyRow = {
      ...KEY,
      taxon: null,
      tally: { ...counts, cellsTotal: 78, nectarCells: 5 },
      lockedVersion: 2,
    };
    const [read] = csvObjects(writeHeader(TALLIES_FILE, 'exact') + writeRow(TALLIES_FILE, row, 'exact'));
    for (const state of CELL_STATES) expect(read?.[state]).toBe(String(counts[state]));
    expect(read).toMatchObject({ taxon: '', cells_total: '78', nectar_cells: '5', locked_version: '2' });
  });

  it('guards every column a person may have typed, and says so in its type', () => {
    const free = FILES.flatMap((file) =>
      file.columns.filter((column) => column.type === 'free text').map((c) => c.name),
    );
    expect([...new Set(free)].sort()).toEqual([
      'first_observer',
      'name',
      'nest',
      'observer',
      'reason',
      'second_observer',
      'settled_by',
      'taxon',
      'team',
    ]);
  });
});

describe('dictionary', () => {
  it('describes every column of every file once, itself included', () => {
    const named = dictionaryRows().map((row) => `${row.file} ${row.name}`);
    expect(new Set(named).size).toBe(named.length);
    expect(named).toEqual(FILES.flatMap((file) => file.columns.map((column) => `${file.name} ${column.name}`)));
  });

  it('says what a blank means exactly where a blank can occur', () => {
    for (const row of dictionaryRows()) expect([row.name, row.blankMeans === '']).toEqual([row.name, row.required]);
  });

  it('leaves no label, type, range or version out and starts no text like a formula', () => {
    for (const row of dictionaryRows()) {
      for (const text of [row.label, row.type, row.allowed, row.since]) expect(text).not.toBe('');
      for (const text of Object.values(row)) expect(String(text)).not.toMatch(/^[=+\-@]/);
    }
  });

  it('reads back from its own file', () => {
    const rows = dictionaryRows();
    const text =
      writeHeader(DICTIONARY_FILE, 'exact') + rows.map((row) => writeRow(DICTIONARY_FILE, row, 'exact')).join('');
    expect(csvObjects(text)[0]).toMatchObject({ file: 'nests.csv', name: 'team', required: 'yes', blank_means: '' });
    expect(csvObjects(text)).toHaveLength(rows.length);
  });
});
