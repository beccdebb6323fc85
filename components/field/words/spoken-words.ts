import { progressWords } from './reading-words';

/**
 * What is read aloud after a press: `cell 13 medium larva, 12 of 33`.
 *
 * @param lastWords the recorder's words, such as `Cell 13: medium larva`; null before the first press.
 */
export function spokenWords(lastWords: string | null, read: number, counted: number | null): string {
  if (lastWords === null) return '';
  const plain = lastWords.replace(/^Cell/, 'cell').replace(': ', ' ');
  return `${plain}, ${progressWords(read, counted)}`;
}
