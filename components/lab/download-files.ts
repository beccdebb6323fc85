import { addressWith } from './list-query';

/** A file that can be taken away. */
export interface DownloadFile {
  name: string;
  title: string;
  holds: string;
  /** The dictionary describes columns, so nothing narrows it. */
  narrowed: boolean;
}

/** What leaves the lab, the most asked for first. */
export const DOWNLOAD_FILES: readonly DownloadFile[] = [
  {
    name: 'tallies.csv',
    title: 'Tallies',
    holds: 'One row a reading: cells by state, nectar, observer, locked version.',
    narrowed: true,
  },
  {
    name: 'cells.csv',
    title: 'Cells',
    holds: 'One row a cell of every reading, with the mark a settlement replaced.',
    narrowed: true,
  },
  {
    name: 'nests.csv',
    title: 'Nests',
    holds: 'One row a nest: code, name, species, place, when it was opened.',
    narrowed: true,
  },
  {
    name: 'visits.csv',
    title: 'Visits',
    holds: 'One row a visit: its local date, purpose and number of readings.',
    narrowed: true,
  },
  {
    name: 'settlements.csv',
    title: 'Settlements',
    holds: 'One row a decision about a cell: both states before it, who decided, and why.',
    narrowed: true,
  },
  {
    name: 'agreement.csv',
    title: 'Agreement',
    holds: 'One row a comparison of two readings of a comb: raw agreement, kappa, alpha, cells left out.',
    narrowed: true,
  },
  {
    name: 'dictionary.csv',
    title: 'Dictionary',
    holds: 'Every column of every file: unit, type, allowed values, what a blank means.',
    narrowed: false,
  },
  {
    name: 'everything.zip',
    title: 'Everything',
    holds: 'All of these files of one moment in one archive, the dictionary included.',
    narrowed: true,
  },
];

/** What narrows a download; empty members let everything through. */
export interface DownloadFilter {
  nest?: string;
  taxon?: string;
  from?: string;
  to?: string;
}

/** The address of a file under a filter; `spreadsheet` asks for the guarded form. */
export function downloadAddress(file: DownloadFile, filter: DownloadFilter, form: 'exact' | 'spreadsheet'): string {
  const guard = form === 'spreadsheet' ? { for: 'spreadsheet' } : {};
  return addressWith(`/api/export/${file.name}`, { ...(file.narrowed ? filter : {}), ...guard });
}

/** What a filter lets through, in words: `nest N12, visited from 2026-06-01`. */
export function filterWords({ nest, taxon, from, to }: DownloadFilter): string {
  const parts = [nest && `nest ${nest}`, taxon, from && `visited from ${from}`, to && `visited until ${to}`].filter(
    Boolean,
  );
  return parts.length === 0 ? 'everything of the team' : parts.join(', ');
}
