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

const DATE = /^\d{4}-\d{2}-\d{2}$/;

function single(params: RawParams, name: string): string | undefined {
  const value = params[name];
  const text = (Array.isArray(value) ? value[0] : value)?.trim();
  return text === '' ? undefined : text;
}

function date(params: RawParams, name: string): string | undefined {
  const text = single(params, name);
  return text && DATE.test(text) && !Number.isNaN(Date.parse(text)) ? text : undefined;
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
    page: Number.isInteger(page) && page > 1 ? page : undefined,
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
