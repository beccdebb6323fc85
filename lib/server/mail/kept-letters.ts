import 'server-only';
import { readDataFile, writeDataFile } from '@/lib/server/env';
import type { ComposedLetter } from './compose-letter';

function fileOf(id: string): string {
  return `letter-${id}.json`;
}

/** Keeps a letter of the demo in the data folder, readable by its owner only. */
export function keepLetter(id: string, letter: ComposedLetter): void {
  writeDataFile(fileOf(id), JSON.stringify(letter));
}

function isComposed(value: unknown): value is ComposedLetter {
  if (typeof value !== 'object' || value === null) return false;
  return ['subject', 'text', 'html'].every((name) => typeof Reflect.get(value, name) === 'string');
}

/**
 * A kept letter; null when there is none.
 *
 * @param id from a row of the asker's own team.
 */
export function keptLetter(id: string): ComposedLetter | null {
  const text = readDataFile(fileOf(id));
  const value: unknown = text === null ? null : JSON.parse(text);
  return isComposed(value) ? value : null;
}
