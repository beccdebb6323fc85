import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';
import { applyTestEnvironment } from '../../lib/cli/test-environment.mjs';

applyTestEnvironment();

const root = fileURLToPath(new URL('../..', import.meta.url));
const guard = 'tests/support/console-guard.ts';
const ownDatabase = 'tests/support/own-database.ts';
const long = process.env.LONG === '1';

/** A kind of test that needs nothing but this process. */
function pure(name: string) {
  return { extends: true as const, test: { name, include: [`tests/${name}/**/*.test.{ts,tsx}`], setupFiles: [guard] } };
}

/** A kind of test that works on a database of its own for each file. */
function stored(name: string) {
  return {
    extends: true as const,
    test: {
      name,
      include: [`tests/${name}/**/*.test.ts`],
      setupFiles: [guard, ownDatabase],
      globalSetup: ['tests/support/database-up.ts'],
      testTimeout: long ? 3_600_000 : 60_000,
      hookTimeout: 120_000,
    },
  };
}

export default defineConfig({
  root,
  resolve: {
    alias: [
      { find: /^@\//, replacement: root },
      { find: 'server-only', replacement: fileURLToPath(new URL('empty.ts', import.meta.url)) },
    ],
  },
  test: {
    pool: 'forks',
    maxWorkers: 2,
    allowOnly: false,
    restoreMocks: true,
    unstubEnvs: true,
    unstubGlobals: true,
    testTimeout: long ? 3_600_000 : 20_000,
    projects: [pure('unit'), pure('property'), stored('db'), stored('api')],
  },
});
