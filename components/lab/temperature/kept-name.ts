import type { KeptView } from './temperature-shapes';

/** What a record is called: its file, or that it was noted by hand. */
export function keptName({ fileName, source }: Pick<KeptView, 'fileName' | 'source'>): string {
  if (fileName) return fileName;
  return source === 'hand' ? 'days noted by hand' : 'a file without a name';
}
