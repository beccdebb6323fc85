/** What was strange about a line of a file. */
export type FileNoteCode =
  | 'unreadable-time'
  | 'unreadable-value'
  | 'impossible'
  | 'skipped-hour'
  | 'out-of-order'
  | 'duplicate'
  | 'duplicate-differs';

/** One strange line, with what was done about it. */
export interface FileNote {
  code: FileNoteCode;
  /** Counted from 1. */
  line: number;
  text: string;
}
