import { addDays } from '@/lib/kit/local-date';

/** What the nests list can be narrowed and sorted by; all as they stand in the address. */
export interface ListQuery {
  q?: string;
  taxon?: string;
  from?: string;
  to?: string;
  sort?: string;
  page?: number;
}

type RawParams = Readonly<Record<string, string | string[] | undefined>>;

const DATE = /^[1-9]\d{3}-\d{2}-\d{2}$/;
/** The last date that has a day after it which the office can hold. */
const LAST_DATE = '9999-12-30';
const LAST_PAGE = 9_999_999;

function single(params: RawParams, name: string): string | undefined {
  const value = params[name];
  const text = (Array.isArray(value) ? value[0] : value)?.trim();
  return text === '' ? undefined : text;
}

/** Is this a day its month has? A browser's date field sends no other, but an address can be typed. */
function isRealDate(text: string): boolean {
  if (!DATE.test(text) || text > LAST_DATE || Number.isNaN(Date.parse(`${text}T00:00:00Z`))) return false;
  return addDays(text, 0) === text;
}

function date(params: RawParams, name: string): string | undefined {
  const text = single(params, name);
  return text && isRealDate(text) ? text : undefined;
}

/** The columns the list sorts by; a leading `-` means from the largest. */
export const SORT_COLUMNS = ['code', 'name', 'taxon', 'openedAt', 'lastVisitAt', 'visits', 'cells'] as const;

/** One of `SORT_COLUMNS`. */
export type SortColumn = (typeof SORT_COLUMNS)[number];

function sort(params: RawParams): string | undefined {
  const text = single(params, 'sort');
  return text && (SORT_COLUMNS as readonly string[]).includes(text.replace(/^-/, '')) ? text : undefined;
}

/** Reads the address of the list; what makes no sense is left out, so that an old bookmark still opens. */
export function readListQuery(params: RawParams): ListQuery {
  const page = Number(single(params, 'page'));
  return {
    q: single(params, 'q')?.slice(0, 200),
    taxon: single(params, 'taxon')?.slice(0, 200),
    from: date(params, 'from'),
    to: date(params, 'to'),
    sort: sort(params),
    page: Number.isInteger(page) && page > 1 && page <= LAST_PAGE ? page : undefined,
  };
}

/** An address with these parameters, empty ones left out: `/nests?q=roof&page=2`. */
export function addressWith(path: string, query: Readonly<Record<string, string | number | undefined>>): string {
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(query)) {
    if (value !== undefined && value !== '') search.set(name, String(value));
  }
  const text = search.toString();
  return text ? `${path}?${text}` : path;
}

/** The sort after a press on a column: up first, down when it was up already. */
export function nextSort(current: string | undefined, column: SortColumn): string {
  return current === column ? `-${column}` : column;
}
