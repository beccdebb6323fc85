import 'server-only';
import { tallyOf } from '@/lib/comb/tally';
import { cellNumber } from '@/lib/comb/walk';
import { AGREEMENT_FILE } from '@/lib/csv/agreement-file';
import { CELLS_FILE } from '@/lib/csv/cells-file';
import { DICTIONARY_FILE, dictionaryRows } from '@/lib/csv/dictionary-file';
import { NESTS_FILE } from '@/lib/csv/nests-file';
import { SETTLEMENTS_FILE } from '@/lib/csv/settlements-file';
import { TALLIES_FILE } from '@/lib/csv/tallies-file';
import { VISITS_FILE } from '@/lib/csv/visits-file';
import { writeHeader, writeRow } from '@/lib/csv/write-row';
import { fromBinary } from '@/lib/server/db/uuid-binary';
import { instantText } from '@/lib/server/presenters/instant-text';
import { presentPlace } from '@/lib/server/presenters/present-nest';
import { agreementLines } from './agreement-lines';
import type { ExportCall, ExportLines } from './export-call';
import { nestPages } from './nest-pages';
import { readingStream } from './reading-stream';
import { settlementLines } from './settlement-lines';
import { visitPages } from './visit-pages';

async function* nestLines(call: ExportCall): AsyncGenerator<string> {
  yield writeHeader(NESTS_FILE, call.form);
  for await (const nests of nestPages(call)) {
    for (const nest of nests) {
      const { lat = null, lon = null, accuracyM = null } = presentPlace(call.ctx.role, nest) ?? {};
      const openedAt = instantText(nest.opened_at_text, nest.opened_at);
      const { code, name, taxon } = nest;
      const row = {
        team: call.ctx.teamName,
        nest: code,
        nestId: fromBinary(nest.id),
        name,
        taxon,
        lat,
        lon,
        accuracyM,
        openedAt,
      };
      yield writeRow(NESTS_FILE, row, call.form);
    }
  }
}

async function* visitLines(call: ExportCall): AsyncGenerator<string> {
  yield writeHeader(VISITS_FILE, call.form);
  for await (const visits of visitPages(call)) {
    for (const { nest, visit, visitDate, readings } of visits) {
      const startedAt = instantText(visit.started_at_text, visit.started_at);
      const key = { team: call.ctx.teamName, nest: nest.code, visit: fromBinary(visit.id), visitDate };
      yield writeRow(VISITS_FILE, { ...key, purpose: visit.purpose, startedAt, readings: readings.length }, call.form);
    }
  }
}

async function* tallyLines(call: ExportCall): AsyncGenerator<string> {
  yield writeHeader(TALLIES_FILE, call.form);
  for await (const { key, taxon, lockedVersion, cells } of readingStream(call)) {
    yield writeRow(TALLIES_FILE, { ...key, taxon, tally: tallyOf(cells), lockedVersion }, call.form);
  }
}

async function* cellLines(call: ExportCall): AsyncGenerator<string> {
  yield writeHeader(CELLS_FILE, call.form);
  for await (const { key, cells } of readingStream(call)) {
    for (const { q, r, state, instar, nectar, unsure, reused, at, settledFrom } of cells) {
      const where = { ...key, cell: cellNumber({ q, r }), q, r };
      yield writeRow(
        CELLS_FILE,
        { ...where, state, instar, nectar, unsure, reused, markedAt: at, settledFrom },
        call.form,
      );
    }
  }
}

async function* dictionaryLines({ form }: ExportCall): AsyncGenerator<string> {
  yield writeHeader(DICTIONARY_FILE, form);
  for (const row of dictionaryRows()) yield writeRow(DICTIONARY_FILE, row, form);
}

/** Every file that can be downloaded, by its name in the address. */
export const EXPORT_FILES: ReadonlyMap<string, ExportLines> = new Map([
  [NESTS_FILE.name, nestLines],
  [VISITS_FILE.name, visitLines],
  [TALLIES_FILE.name, tallyLines],
  [CELLS_FILE.name, cellLines],
  [SETTLEMENTS_FILE.name, settlementLines],
  [AGREEMENT_FILE.name, agreementLines],
  [DICTIONARY_FILE.name, dictionaryLines],
]);
