import 'server-only';
import type { CsvForm } from '@/lib/csv/write-row';
import { HttpProblem } from '@/lib/server/http/problem';
import { parseLocalDate } from '@/lib/server/queries/local-date-range';
import type { NestFilter } from '@/lib/server/queries/nest-conditions';

/** The query parameters of every download. */
export const EXPORT_PARAMS = ['nest', 'taxon', 'from', 'to', 'for'] as const;

/** Those parameters as they come: at most one text each. */
export type ExportParams = Partial<Record<(typeof EXPORT_PARAMS)[number], string>>;

/** What a download holds, and in which form. */
export interface ExportQuery {
  filter: Omit<NestFilter, 'q'>;
  form: CsvForm;
}

/** A form sends an empty text for a field left blank. */
function given(text: string | undefined): string | undefined {
  return text === '' ? undefined : text;
}

function parseForm(text: string): CsvForm {
  if (text !== 'exact' && text !== 'spreadsheet') throw new HttpProblem('param');
  return text;
}

/**
 * Reads the query of a download.
 *
 * @throws HttpProblem `param` for a date that does not exist or a form there is none of.
 */
export function parseExportQuery(params: ExportParams): ExportQuery {
  const [from, to] = [given(params.from), given(params.to)];
  return {
    filter: {
      code: given(params.nest),
      taxon: given(params.taxon),
      from: from && parseLocalDate(from),
      to: to && parseLocalDate(to),
    },
    form: parseForm(given(params.for) ?? 'exact'),
  };
}
