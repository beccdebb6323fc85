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

/** The checks, in lanes that run beside each other; within a lane each waits for the one before. */
export const CHECK_LANES: readonly (readonly CheckStep[])[] = [
  [{ name: 'lint', script: 'eslint/bin/eslint.js', args: ['--config', ESLINT_CONFIG, '--max-warnings=0', '.'] }],
  [
    {
      name: 'format',
      script: 'prettier/bin/prettier.cjs',
      args: ['--check', '--log-level=warn', '.', '!tests/fixtures/**'],
    },
    {
      name: 'boundaries',
      script: 'dependency-cruiser/bin/dependency-cruise.mjs',
      args: ['--config', CRUISER_CONFIG, '--output-type=err-long', ...CODE_FOLDERS],
    },
    { name: 'dead code', script: 'knip/bin/knip.js', args: ['--no-progress', '--treat-config-hints-as-errors'] },
    // The compiler knows pages and routes only once their types have been written.
    { name: 'route types', script: 'next/dist/bin/next', args: ['typegen'] },
    { name: 'types', script: 'typescript/bin/tsc', args: ['--noEmit', '--project', 'tsconfig.json'] },
    { name: 'worker types', script: 'typescript/bin/tsc', args: ['--noEmit', '--project', 'workers/tsconfig.json'] },
  ],
];
