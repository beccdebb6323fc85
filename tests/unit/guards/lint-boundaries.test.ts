import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { type PlantedTree, plantTree } from '@/tests/support/planted-tree';
import { LINT_BREACHES } from './planted-files';

/** What the linter says about one file. */
interface FileReport {
  filePath: string;
  messages: { ruleId: string | null; message: string; severity: number }[];
}

const ALLOWED = {
  'components/field/good.tsx': "import { tally } from '@/lib/comb/tally';\n\nexport const good = tally;\n",
  'lib/brood/good.ts':
    "import type { State } from '@/lib/comb/states';\nimport { ok } from '@/lib/kit/result';\n\nexport const good = (state: State) => ok(state);\n",
  'lib/protocol/good.ts': "import { z } from 'zod';\n\nexport const good = z.string();\n",
  'lib/kit/good.ts': 'export const now = Date.now();\n',
  'app/(lab)/nests/page.tsx':
    "import { nests } from '@/lib/server/queries/nests';\n\nexport default function Page() {\n  return nests;\n}\n",
};

let tree: PlantedTree;
let reports: FileReport[];

function complaintsAbout(file: string): string[] {
  const report = reports.find(({ filePath }) => filePath.endsWith(`/${file}`));
  if (!report) throw new Error(`The linter did not look at ${file}.`);
  return report.messages.map(({ ruleId, message }) => `${message} [${ruleId}]`);
}

beforeAll(async () => {
  const planted = Object.fromEntries(LINT_BREACHES.map(({ file, text }) => [file, text]));
  tree = plantTree({ ...planted, ...ALLOWED });
  const { output } = await tree.run('eslint/bin/eslint.js', [
    '--config',
    'tests/config/eslint.config.mjs',
    '--format=json',
    '.',
  ]);
  reports = JSON.parse(output.slice(output.indexOf('[{'))) as FileReport[];
}, 120_000);

afterAll(() => tree.remove());

describe('the linter', () => {
  test.each(LINT_BREACHES)('refuses $file with words that say so', ({ file, says }) => {
    expect(complaintsAbout(file).join('\n')).toMatch(says);
  });

  test.each(Object.keys(ALLOWED))('has nothing against %s', (file) => {
    expect(complaintsAbout(file)).toEqual([]);
  });

  test('counts every complaint as an error, so that the check fails', () => {
    expect(reports.flatMap(({ messages }) => messages).filter(({ severity }) => severity !== 2)).toEqual([]);
  });
});
