import type { LoggerReading } from '@/lib/brood/temperature/record';
import type { FileNote } from './file-note';
import { type ReadingRules, celsiusOf, instantOf } from './read-lines';
import type { FileLine } from './split-cells';

/** A reading with the line it stands in. */
interface LineReading extends LoggerReading {
  line: number;
}

/** What was read, and what was strange. */
export interface ReadValues<Value> {
  values: Value[];
  notes: FileNote[];
}

function readEach(body: readonly FileLine[], rules: ReadingRules, column: number): ReadValues<LineReading> {
  const values: LineReading[] = [];
  const notes: FileNote[] = [];
  let passed = -Infinity;
  for (const line of body) {
    const at = instantOf(line, rules, passed);
    const celsius = celsiusOf(line, column, rules);
    const problem = [at, celsius].find((part) => !part.ok);
    if (problem && !problem.ok) notes.push(problem.error);
    if (!at.ok || !celsius.ok) continue;
    if (at.value < passed) {
      const text = `Line ${line.number}: earlier than the line before; put where it belongs.`;
      notes.push({ code: 'out-of-order', line: line.number, text });
    }
    passed = Math.max(passed, at.value);
    values.push({ at: at.value, celsius: celsius.value, line: line.number });
  }
  return { values, notes };
}

function repeatNote(first: LineReading, again: LineReading): FileNote {
  const isSame = first.celsius === again.celsius;
  const also = isSame ? 'and temperature as' : 'as';
  const kept = isSame ? 'left out' : `the temperatures differ and that of line ${first.line} is kept`;
  return {
    code: isSame ? 'duplicate' : 'duplicate-differs',
    line: again.line,
    text: `Line ${again.line}: the same time ${also} line ${first.line}; ${kept}.`,
  };
}

/** Reads a logger's lines in the order of time, each time once; the first line of a time is kept. */
export function readLogger(body: readonly FileLine[], rules: ReadingRules, column: number): ReadValues<LoggerReading> {
  const { values, notes } = readEach(body, rules, column);
  const kept: LineReading[] = [];
  for (const value of values.sort((a, b) => a.at - b.at || a.line - b.line)) {
    const before = kept.at(-1);
    if (before?.at === value.at) notes.push(repeatNote(before, value));
    else kept.push(value);
  }
  return {
    values: kept.map(({ at, celsius }) => ({ at, celsius })),
    notes: notes.sort((a, b) => a.line - b.line),
  };
}
