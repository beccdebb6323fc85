import 'server-only';
import { HttpProblem } from '@/lib/server/http/problem';
import { parseLocalDate } from './local-date-range';
import type { NestFilter } from './nest-conditions';

/** What the list may be sorted by, and the SQL of it; `cells` is worked out from the marks instead. */
export const SORT_COLUMNS = {
  code: 'n.code',
  name: 'n.name COLLATE utf8mb4_unicode_ci',
  taxon: 'n.taxon COLLATE utf8mb4_unicode_ci',
  openedAt: 'n.opened_at',
  lastVisitAt: 'last_visit',
  visits: 'visit_count',
  cells: null,
} as const;

/** One of the sortable columns. */
export type SortColumn = keyof typeof SORT_COLUMNS;

/** The query parameters of `GET /api/nests`. */
export const NEST_LIST_PARAMS = ['q', 'taxon', 'from', 'to', 'sort', 'page'] as const;

/** Those parameters as they come: at most one text each. */
export type NestListParams = Partial<Record<(typeof NEST_LIST_PARAMS)[number], string>>;

/** What a list shows, in which order. */
export interface NestListQuery {
  filter: NestFilter;
  sort: SortColumn;
  descending: boolean;
  /** From 1. */
  page: number;
}

const LONGEST_SEARCH = 200;

function isSortColumn(text: string): text is SortColumn {
  return Object.hasOwn(SORT_COLUMNS, text);
}

function parseSort(text: string): Pick<NestListQuery, 'sort' | 'descending'> {
  const descending = text.startsWith('-');
  const sort = descending ? text.slice(1) : text;
  if (!isSortColumn(sort)) throw new HttpProblem('param');
  return { sort, descending };
}

function parsePage(text: string): number {
  if (!/^[1-9]\d{0,6}$/.test(text)) throw new HttpProblem('param');
  return Number(text);
}

/** An empty parameter, as a form sends it for a field left blank, is no parameter. */
function given(text: string | undefined): string | undefined {
  return text === '' ? undefined : text;
}

/**
 * Reads the query of the nest list.
 *
 * @throws HttpProblem `param` for a sort column that is not allowed, a page that is not a number from 1, a date that
 * does not exist, or a search longer than 200 characters.
 */
export function parseNestListQuery(params: NestListParams): NestListQuery {
  const { q = '', taxon = '' } = params;
  if ([...q].length > LONGEST_SEARCH || [...taxon].length > LONGEST_SEARCH) throw new HttpProblem('param');
  const [from, to] = [given(params.from), given(params.to)];
  return {
    filter: {
      q: given(params.q),
      taxon: given(params.taxon),
      from: from && parseLocalDate(from),
      to: to && parseLocalDate(to),
    },
    ...parseSort(given(params.sort) ?? 'code'),
    page: parsePage(given(params.page) ?? '1'),
  };
}
