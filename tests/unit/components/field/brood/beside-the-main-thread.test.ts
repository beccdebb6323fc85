import { readFileSync, readdirSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { expect, test } from 'vitest';

function sourcesUnder(folder: string): string[] {
  return readdirSync(folder)
    .map((name) => join(folder, name))
    .flatMap((path) => (statSync(path).isDirectory() ? sourcesUnder(path) : [path]))
    .filter((path) => /\.tsx?$/.test(path));
}

test('no page of the phone imports the estimator: it runs in the worker only', () => {
  const sources = ['app/(field)', 'components/field', 'lib/offline'].flatMap(sourcesUnder);
  expect(sources.length).toBeGreaterThan(100);
  const importing = sources.filter((path) => /from '[^']*\/estimate-nest'/.test(readFileSync(path, 'utf8')));
  expect(importing).toEqual([]);
});
