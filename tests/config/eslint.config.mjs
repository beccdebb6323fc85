import coreWebVitals from 'eslint-config-next/core-web-vitals';
import nextTypescript from 'eslint-config-next/typescript';
import { ourRules } from './eslint-rules.mjs';
import { EDGE_FILES } from './import-table.mjs';

const ARGUMENT = 'Take a clock, random source or id as an argument; lib/kit has the types, an edge file the real one.';

/** Where the running program meets chance and time. */
const EDGE_SYNTAX = [
  {
    selector: "CallExpression[callee.object.name='Date'][callee.property.name='now']",
    message: `No Date.now here. ${ARGUMENT}`,
  },
  { selector: "NewExpression[callee.name='Date'][arguments.length=0]", message: `No new Date() here. ${ARGUMENT}` },
  {
    selector: "CallExpression[callee.object.name='Math'][callee.property.name='random']",
    message: `No Math.random here. ${ARGUMENT}`,
  },
  { selector: "CallExpression[callee.property.name='randomUUID']", message: `No randomUUID here. ${ARGUMENT}` },
  {
    selector: "CallExpression[callee.object.name='performance'][callee.property.name='now']",
    message: `No performance.now here. ${ARGUMENT}`,
  },
];

/** A test that is switched off or runs alone hides what it would say. */
const SWITCHED_OFF = [
  {
    selector: 'MemberExpression[object.name=/^(describe|it|test)$/][property.name=/^(only|skip|todo)$/]',
    message: 'No .only, .skip or .todo: fix the test or delete it.',
  },
];

const NEXT_FILES = [
  'app/**/{page,layout,template,loading,error,not-found,default,global-error,manifest,robots,icon}.{ts,tsx}',
  '*.config.{ts,mjs}',
  'tests/config/*.{ts,mjs}',
  'tests/support/e2e-up.ts',
];

/** Rules about React, which cost time where there is none. */
const REACT_RULES = coreWebVitals
  .flatMap(({ rules = {} }) => Object.keys(rules))
  .filter((name) => /^(react|react-hooks|jsx-a11y)\//.test(name));

const config = [
  { ignores: ['.next/**', '.data*/**', '.artifacts/**', 'public/**', 'node_modules/**', 'next-env.d.ts'] },
  { linterOptions: { reportUnusedDisableDirectives: 'error' } },
  ...coreWebVitals,
  ...nextTypescript,
  {
    files: ['**/*.{ts,tsx,mjs}'],
    plugins: { ours: ourRules },
    rules: {
      'ours/boundaries': 'error',
      'import/no-default-export': 'error',
      'import/first': 'error',
      'import/no-duplicates': 'error',
      'no-restricted-imports': [
        'error',
        {
          patterns: [
            {
              group: ['../../*', '../..'],
              message: 'Two folders up is too far to follow: write @/ and the path from the root.',
            },
          ],
        },
      ],
      'no-restricted-syntax': ['error', ...EDGE_SYNTAX],
      'no-console': 'error',
      'max-lines': ['error', { max: 400 }],
      'max-params': ['error', 3],
      'no-nested-ternary': 'error',
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      // Entering and leaving /field is a full document load on purpose: only then does its service worker see the page.
      '@next/next/no-location-assign-relative-destination': 'off',
      '@next/next/no-html-link-for-pages': 'off',
    },
  },
  {
    files: ['**/*.{ts,tsx}'],
    languageOptions: { parserOptions: { projectService: { allowDefaultProject: [] }, tsconfigRootDir: process.cwd() } },
    rules: {
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-non-null-assertion': 'error',
      '@typescript-eslint/no-floating-promises': 'error',
      '@typescript-eslint/no-misused-promises': ['error', { checksVoidReturn: { attributes: false } }],
      '@typescript-eslint/require-array-sort-compare': ['error', { ignoreStringArrays: true }],
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      '@typescript-eslint/no-unused-expressions': 'error',
      '@typescript-eslint/switch-exhaustiveness-check': ['error', { considerDefaultExhaustiveForUnions: true }],
    },
  },
  { files: ['lib/server/**/*.ts'], rules: { 'ours/server-only-first': 'error' } },
  { files: ['lib/**/*.ts', 'models/**/*.ts'], rules: { 'ours/documented-exports': 'error' } },
  {
    files: ['app/**', 'components/**', 'lib/**', 'models/**', 'workers/**'],
    rules: { 'max-lines-per-function': ['error', { max: 60, skipBlankLines: true, skipComments: true }] },
  },
  { files: EDGE_FILES, rules: { 'no-restricted-syntax': 'off' } },
  { files: ['tests/**'], rules: { 'no-restricted-syntax': ['error', ...SWITCHED_OFF] } },
  { files: ['lib/cli/**', 'tests/support/console-guard.ts'], rules: { 'no-console': 'off' } },
  {
    files: ['lib/**', 'models/**', 'migrations/**', 'tests/**'],
    ignores: ['lib/offline/hooks/**', '**/*.tsx'],
    rules: Object.fromEntries(REACT_RULES.map((name) => [name, 'off'])),
  },
  { files: NEXT_FILES, rules: { 'import/no-default-export': 'off' } },
  {
    files: ['tests/config/**'],
    rules: { 'no-restricted-imports': 'off', 'import/no-anonymous-default-export': 'off' },
  },
];

export default config;
