/** A file that breaks one rule, and the words the linter must answer with. */
export interface Planted {
  file: string;
  text: string;
  says: RegExp;
}

const value = (source: string) => `import { thing } from '${source}';\n\nexport const used = thing;\n`;
const type = (source: string) => `import type { Thing } from '${source}';\n\nexport type Used = Thing;\n`;

/** One breach of each line of the import table, and of the other rules that a review would otherwise have to catch. */
export const LINT_BREACHES: readonly Planted[] = [
  {
    file: 'app/(field)/field/a.tsx',
    text: value('@/lib/server/env'),
    says: /app\/\(field\) may not import lib\/server\/env/,
  },
  { file: 'app/(lab)/nests/a.tsx', text: value('@/lib/server/commands/settle'), says: /app\/\(lab\) may not import/ },
  {
    file: 'app/(lab)/nests/b.tsx',
    text: value('@/lib/offline/drain'),
    says: /app\/\(lab\) may not import lib\/offline/,
  },
  { file: 'app/(auth)/sign-in/a.tsx', text: value('@/lib/server/queries/nests'), says: /app\/\(auth\) may not import/ },
  { file: 'app/api/nests/a.ts', text: value('@/models/nest'), says: /app\/api may not import models\/nest/ },
  { file: 'app/a.tsx', text: value('@/lib/comb/tally'), says: /app may not import lib\/comb/ },
  { file: 'components/ui/a.tsx', text: value('@/lib/comb/tally'), says: /components\/ui may not import lib\/comb/ },
  {
    file: 'components/comb/a.tsx',
    text: value('@/components/field/recorder'),
    says: /components\/comb may not import/,
  },
  { file: 'components/charts/a.tsx', text: value('@/components/shell/bar'), says: /components\/charts may not import/ },
  { file: 'components/shell/a.tsx', text: value('@/components/lab/list'), says: /components\/shell may not import/ },
  {
    file: 'components/field/a.tsx',
    text: type('@/lib/server/auth/role'),
    says: /components\/field may not import lib\/server/,
  },
  { file: 'components/lab/a.tsx', text: type('@/models/nest'), says: /components\/lab may not import models/ },
  { file: 'lib/kit/a.ts', text: value('@/lib/comb/tally'), says: /lib\/kit may not import lib\/comb/ },
  { file: 'lib/comb/a.ts', text: value('@/lib/brood/answer'), says: /lib\/comb may not import lib\/brood/ },
  { file: 'lib/brood/a.ts', text: value('@/lib/protocol/op'), says: /lib\/brood may not import lib\/protocol/ },
  { file: 'lib/brood/b.ts', text: value('node:fs'), says: /lib\/brood may not use the package node:fs/ },
  { file: 'lib/stats/a.ts', text: value('@/lib/comb/tally'), says: /lib\/stats may not import lib\/comb/ },
  { file: 'lib/csv/a.ts', text: value('@/lib/server/env'), says: /lib\/csv may not import lib\/server/ },
  { file: 'lib/protocol/a.ts', text: value('dexie'), says: /lib\/protocol may not use the package dexie/ },
  { file: 'lib/offline/a.ts', text: type('@/models/op'), says: /lib\/offline may not import models/ },
  {
    file: 'lib/server/a.ts',
    text: `import 'server-only';\n${value('@/components/ui/button')}`,
    says: /lib\/server may not import/,
  },
  { file: 'lib/cli/a.ts', text: value('@/models/nest'), says: /lib\/cli may not import models/ },
  { file: 'models/a.ts', text: value('@/lib/server/env'), says: /models may not import lib\/server/ },
  { file: 'migrations/a.ts', text: value('@/lib/server/env'), says: /migrations may not import lib\/server/ },
  { file: 'migrations/b.ts', text: value('zod'), says: /migrations may not use the package zod/ },
  { file: 'workers/a.ts', text: value('@/lib/server/env'), says: /workers may not import lib\/server/ },
  { file: 'lib/comb/up.ts', text: value('../../lib/kit/uuid'), says: /Two folders up/ },
  { file: 'lib/comb/sideways.ts', text: value('../brood/answer'), says: /lib\/comb may not import lib\/brood/ },
  {
    file: 'lib/comb/late.ts',
    text: "export const late = import('@/lib/offline/drain');\n",
    says: /may not import lib\/offline/,
  },
  { file: 'lib/server/b.ts', text: 'export const marked = 1;\n', says: /Begin with import 'server-only'/ },
  { file: 'lib/comb/now.ts', text: 'export const now = Date.now();\n', says: /No Date\.now here/ },
  { file: 'lib/comb/today.ts', text: 'export const today = new Date();\n', says: /No new Date\(\) here/ },
  { file: 'lib/comb/chance.ts', text: 'export const chance = Math.random();\n', says: /No Math\.random here/ },
  { file: 'lib/comb/id.ts', text: 'export const id = crypto.randomUUID();\n', says: /No randomUUID here/ },
  { file: 'lib/comb/default.ts', text: 'const one = 1;\n\nexport default one;\n', says: /no-default-export/ },
  {
    file: 'lib/comb/bare.ts',
    text: 'export function bare(): number {\n  return 1;\n}\n',
    says: /Say above bare what it is for/,
  },
  { file: 'lib/comb/any.ts', text: 'export const loose: any = 1;\n', says: /no-explicit-any/ },
  { file: 'lib/comb/noise.ts', text: "console.log('x');\n\nexport {};\n", says: /no-console/ },
  { file: 'lib/comb/float.ts', text: 'void 0;\nPromise.resolve(1);\n\nexport {};\n', says: /no-floating-promises/ },
  {
    file: 'tests/unit/a.test.ts',
    text: "import { test } from 'vitest';\n\ntest.skip('x', () => {});\n",
    says: /No \.only, \.skip/,
  },
];
