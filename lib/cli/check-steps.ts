/** One check of the source: a name for people and the program that does it. */
export interface CheckStep {
  name: string;
  /** A script under `node_modules`, run by this Node, and its arguments. */
  script: string;
  args: readonly string[];
}

const ESLINT_CONFIG = 'tests/config/eslint.config.mjs';
const CRUISER_CONFIG = 'tests/config/dependency-cruiser.config.mjs';
const CODE_FOLDERS = ['app', 'components', 'lib', 'models', 'migrations', 'workers', 'tests'];

/** Everything `npm run check` does, in this order. The route types must exist before the compiler runs. */
export const CHECK_STEPS: readonly CheckStep[] = [
  {
    name: 'format',
    script: 'prettier/bin/prettier.cjs',
    args: ['--check', '--log-level=warn', '.', '!tests/fixtures/**'],
  },
  { name: 'lint', script: 'eslint/bin/eslint.js', args: ['--config', ESLINT_CONFIG, '--max-warnings=0', '.'] },
  {
    name: 'boundaries',
    script: 'dependency-cruiser/bin/dependency-cruise.mjs',
    args: ['--config', CRUISER_CONFIG, '--output-type=err-long', ...CODE_FOLDERS],
  },
  { name: 'dead code', script: 'knip/bin/knip.js', args: ['--no-progress', '--treat-config-hints-as-errors'] },
  { name: 'route types', script: 'next/dist/bin/next', args: ['typegen'] },
  { name: 'types', script: 'typescript/bin/tsc', args: ['--noEmit', '--project', 'tsconfig.json'] },
  { name: 'worker types', script: 'typescript/bin/tsc', args: ['--noEmit', '--project', 'workers/tsconfig.json'] },
];
