import 'server-only';
import type { CsvForm } from '@/lib/csv/write-row';
import type { TeamContext } from '@/lib/server/auth/team-context';
import type { NestFilter } from '@/lib/server/queries/nest-conditions';
import type { TeamScope } from '@/lib/server/queries/team-scope';

/** What the rows of one download are made from. */
export interface ExportCall {
  ctx: TeamContext;
  /** Reads from the download's snapshot. */
  scope: TeamScope;
  filter: Omit<NestFilter, 'q'>;
  form: CsvForm;
}

/** The lines of one file: header first, each with its line break. */
export type ExportLines = (call: ExportCall) => AsyncGenerator<string>;
