import { countWords, dateWords, momentWords } from '@/components/ui/date-words';
import type { FileNote } from '@/lib/brood/temperature/csv/file-note';
import type { FileLayout } from '@/lib/brood/temperature/csv/layout';
import type { PreviewView } from './temperature-shapes';

const DELIMITERS: Readonly<Record<FileLayout['delimiter'], string>> = {
  '\t': 'tabs',
  ';': 'semicolons',
  ',': 'commas',
};
const ORDERS: Readonly<Record<FileLayout['order'], string>> = {
  iso: 'year, month, day',
  dmy: 'day, month, year',
  mdy: 'month, day, year',
};
const UNIT_FROM: Readonly<Record<FileLayout['unitFrom'], string>> = {
  file: 'the file says so',
  person: 'you said so',
  values: 'the file names no unit, and nothing in it is above 45',
};

const NOTE_WORDS: Readonly<Record<FileNote['code'], [one: string, many: string]>> = {
  'unreadable-time': ['line without a time that can be read', 'lines without a time that can be read'],
  'unreadable-value': ['line without a temperature that can be read', 'lines without a temperature that can be read'],
  impossible: ['temperature that cannot be', 'temperatures that cannot be'],
  'skipped-hour': ['time that the clocks skipped', 'times that the clocks skipped'],
  'out-of-order': ['line out of order', 'lines out of order'],
  duplicate: ['line twice', 'lines twice'],
  'duplicate-differs': ['time twice with another temperature', 'times twice with another temperature'],
};

/** A preview that could be read. */
type ReadPreview = Extract<PreviewView, { kind: 'read' }>;

/** How a file was recognised: terms and what is said about them. */
export function layoutWords({ layout, ...read }: ReadPreview, zone: string): { term: string; children: string }[] {
  const { kind, delimiter, decimal, order, columns, unit, unitFrom, clock } = layout;
  const moment = (text: string) => (kind === 'logger' ? momentWords(text, zone, '') : dateWords(text, ''));
  const clockWords = clock === 'local' ? `clocks of ${zone}` : 'the file gives the distance from UTC';
  return [
    { term: 'Recognised as', children: kind === 'logger' ? 'readings of a logger' : 'lowest and highest of each day' },
    { term: 'Columns', children: `time: ${columns.time}; temperature: ${columns.temperature}` },
    { term: 'Written with', children: `${DELIMITERS[delimiter]}, decimal ${decimal === '.' ? 'point' : 'comma'}` },
    { term: 'Dates', children: kind === 'logger' ? `${ORDERS[order]}; ${clockWords}` : ORDERS[order] },
    { term: 'Unit', children: `°${unit} (${UNIT_FROM[unitFrom]})` },
    { term: kind === 'logger' ? 'Readings' : 'Days', children: String(read.count) },
    { term: 'From, to', children: `${moment(read.from)} – ${moment(read.to)}` },
    { term: 'Lowest, highest', children: `${read.lowest.toFixed(1)} – ${read.highest.toFixed(1)} °C` },
    { term: 'Gaps', children: read.gaps === 0 ? 'none' : countWords(read.gaps, 'gap') },
    { term: 'Strange lines', children: noteCountWords(read.noteCounts) },
  ];
}

function noteCountWords(counts: ReadPreview['noteCounts']): string {
  const parts = Object.entries(counts).map(([code, count]) => {
    const [one, many] = NOTE_WORDS[code as FileNote['code']];
    return countWords(count, one, many);
  });
  return parts.length === 0 ? 'none' : parts.join('; ');
}
