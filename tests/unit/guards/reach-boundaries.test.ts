import { beforeAll, describe, expect, test } from 'vitest';
import { plantTree } from '@/tests/support/planted-tree';

const CRUISER = 'dependency-cruiser/bin/dependency-cruise.mjs';
const ARGS = ['--config', 'tests/config/dependency-cruiser.config.mjs', '--output-type=err-long'];
const FOLDERS = ['app', 'components', 'lib', 'models', 'workers'];

const value = (name: string, source: string) =>
  `import { ${name} } from '${source}';\n\nexport const used = ${name};\n`;

/** What both projects have: a server file, a model, and something allowed in every other folder. */
const SOUND = {
  'lib/server/env.ts': "import 'server-only';\n\nexport const used = 1;\n",
  'models/nest.ts': "import type { Model } from 'sequelize';\n\nexport type Nest = Model;\n",
  'lib/server/read.ts':
    "import 'server-only';\nimport type { Nest } from '@/models/nest';\n\nexport type Read = Nest;\n",
  'app/api/health/route.ts': value('used', '@/lib/server/env'),
  'lib/protocol/shape.ts': value('z', 'zod'),
  'components/field/fine.tsx': value('used', '@/lib/offline/fine'),
  'lib/offline/fine.ts': value('used', '@/lib/protocol/shape'),
  'workers/fine.ts': value('used', '@/lib/offline/fine'),
};

const UNSOUND = {
  'components/field/list.tsx': value('used', '@/lib/offline/second'),
  'lib/offline/second.ts': value('used', '@/lib/offline/third'),
  'lib/offline/third.ts': value('used', '@/lib/server/env'),
  'workers/w.ts': value('used', '@/lib/offline/typed'),
  'lib/offline/typed.ts': "import type { Nest } from '@/models/nest';\n\nexport const used: Nest | null = null;\n",
  'app/(lab)/nests/page.tsx': "import type { Nest } from '@/models/nest';\n\nexport type N = Nest;\n",
  'lib/brood/fetch.ts': value('z', 'zod'),
  'lib/brood/files.ts': value('readFileSync', 'node:fs'),
  'lib/comb/one.ts': "import { two } from './two';\n\nexport const one = () => two;\n",
  'lib/comb/two.ts': "import { one } from './one';\n\nexport const two = () => one;\n",
  'lib/kit/lost.ts': value('nothing', './nothing'),
};

/** Runs the dependency check over a project of these files. */
async function cruise(files: Readonly<Record<string, string>>): Promise<{ code: number; output: string }> {
  const tree = plantTree(files);
  try {
    return await tree.run(CRUISER, [...ARGS, ...FOLDERS]);
  } finally {
    tree.remove();
  }
}

describe('the dependency check', () => {
  let found: { code: number; output: string };

  beforeAll(async () => {
    found = await cruise({ ...SOUND, ...UNSOUND });
  }, 120_000);

  test.each([
    [
      'a component that reaches the server through two other files',
      /reach of components: components\/field\/list\.tsx/,
    ],
    ['a file of the phone that reaches the server', /reach of lib\/offline: lib\/offline\/second\.ts/],
    ['a worker that reaches a model through a type', /reach of workers: workers\/w\.ts/],
    ['a page that names a model', /models: app\/\(lab\)\/nests\/page\.tsx/],
    ['a pure folder that uses a package', /packages of lib\/brood: lib\/brood\/fetch\.ts/],
    ['a pure folder that reads files', /packages of lib\/brood: lib\/brood\/files\.ts/],
    ['a ring of files', /cycle: lib\/comb\/one\.ts/],
    ['an import of nothing', /unresolved: lib\/kit\/lost\.ts/],
  ])('finds %s', (_, finding) => {
    expect(found.output).toMatch(finding);
  });

  test('fails the check when it finds something', () => {
    expect(found.code).toBeGreaterThan(0);
  });

  test('has nothing against the ways that are allowed, and did look at the files', async () => {
    const { code, output } = await cruise(SOUND);
    expect(output).toMatch(/no dependency violations found \([1-9]/);
    expect(code).toBe(0);
  }, 120_000);
});
