import { describe, expect, it } from 'vitest';
import { DOWNLOAD_FILES, downloadAddress, filterWords } from '@/components/lab/download-files';

const file = (name: string) => {
  const found = DOWNLOAD_FILES.find((candidate) => candidate.name === name);
  if (!found) throw new Error(`no file ${name}`);
  return found;
};

describe('addresses of downloads', () => {
  it('carry the filter, and ask for the guarded form by name', () => {
    const filter = { nest: 'N12', from: '2026-06-01' };
    expect(downloadAddress(file('cells.csv'), filter, 'exact')).toBe('/api/export/cells.csv?nest=N12&from=2026-06-01');
    expect(downloadAddress(file('tallies.csv'), {}, 'spreadsheet')).toBe('/api/export/tallies.csv?for=spreadsheet');
  });

  it('never narrow the dictionary', () => {
    expect(downloadAddress(file('dictionary.csv'), { nest: 'N12' }, 'exact')).toBe('/api/export/dictionary.csv');
  });
});

describe('a filter in words', () => {
  it('says what the files hold', () => {
    expect(filterWords({})).toBe('everything of the team');
    expect(filterWords({ nest: 'N12', taxon: 'Polistes fuscatus', to: '2026-06-30' })).toBe(
      'nest N12, Polistes fuscatus, visited until 2026-06-30',
    );
  });
});
