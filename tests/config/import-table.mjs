/**
 * Who may import whom: the table in DEVELOPERS.md, read by the linter (direct imports) and by dependency-cruiser
 * (transitive and type-only ones). `lib/kit` and the folder itself are always allowed; what is not listed is an error.
 *
 * @typedef {object} FolderRule
 * @property {string} folder path from the root
 * @property {string[]} may folders it may import
 * @property {string[]} [packages] when given, the only npm packages it may import (Node's own modules count)
 * @property {string} instead what to do instead, the end of every error message
 */

const PURE = ['lib/comb', 'lib/brood', 'lib/stats', 'lib/csv', 'lib/protocol'];
const FOR_COMPONENTS = ['lib/comb', 'lib/brood', 'lib/stats', 'lib/csv', 'lib/offline'];
const PURE_INSTEAD = 'This folder is pure: take what you need as an argument, or move the code to the folder that may.';
const UI_INSTEAD =
  'Components show what they are given: let the page or a hook of lib/offline fetch it and pass plain data.';

/** Folders in order of search: the first that contains a file is the file's folder. @type {FolderRule[]} */
export const IMPORT_TABLE = [
  {
    folder: 'app/(field)',
    may: ['components', 'lib/offline', 'lib/brood', 'lib/comb'],
    instead: 'The field page must open with no network: take data from lib/offline, not from the server.',
  },
  {
    folder: 'app/(lab)',
    may: ['components', 'lib/server/auth', 'lib/server/queries', 'lib/stats', 'lib/brood', 'lib/comb'],
    instead: 'Pages compose: ask a function of lib/server/queries, and keep rules in lib.',
  },
  {
    folder: 'app/(auth)',
    may: ['components', 'lib/server/auth'],
    instead: 'Sign-in pages only use components and lib/server/auth.',
  },
  {
    folder: 'app/api',
    may: ['lib/server', 'lib/protocol'],
    instead: 'A route handler is built by the wrapper in lib/server/http and calls one command or query there.',
  },
  {
    folder: 'app',
    may: ['components', 'lib/server/auth'],
    instead: 'Files beside the route groups only frame the pages.',
  },
  {
    folder: 'components/ui',
    may: [],
    instead: 'Primitives know nothing of our data: pass text, numbers and children.',
  },
  { folder: 'components/comb', may: ['components/ui', ...FOR_COMPONENTS], instead: UI_INSTEAD },
  { folder: 'components/charts', may: ['components/ui', 'components/comb', ...FOR_COMPONENTS], instead: UI_INSTEAD },
  {
    folder: 'components/shell',
    may: ['components/ui', 'components/comb', 'components/charts', ...FOR_COMPONENTS],
    instead: UI_INSTEAD,
  },
  {
    folder: 'components/field',
    may: ['components/ui', 'components/comb', 'components/charts', 'components/shell', ...FOR_COMPONENTS],
    instead: UI_INSTEAD,
  },
  {
    folder: 'components/lab',
    may: ['components/ui', 'components/comb', 'components/charts', 'components/shell', ...FOR_COMPONENTS],
    instead: UI_INSTEAD,
  },
  { folder: 'lib/kit', may: [], packages: [], instead: 'lib/kit is the bottom: it imports nothing.' },
  { folder: 'lib/comb', may: [], packages: [], instead: PURE_INSTEAD },
  { folder: 'lib/brood', may: ['lib/comb'], packages: [], instead: PURE_INSTEAD },
  { folder: 'lib/stats', may: [], packages: [], instead: PURE_INSTEAD },
  { folder: 'lib/csv', may: ['lib/comb', 'lib/brood'], packages: [], instead: PURE_INSTEAD },
  { folder: 'lib/protocol', may: ['lib/comb'], packages: ['zod'], instead: PURE_INSTEAD },
  {
    folder: 'lib/offline',
    may: ['lib/comb', 'lib/brood', 'lib/protocol'],
    instead: 'The phone and the server share only lib/protocol and the pure folders.',
  },
  {
    folder: 'lib/server',
    may: [...PURE, 'models'],
    instead: 'The server knows the pure folders and the models; pages and components call it, never the reverse.',
  },
  {
    folder: 'lib/cli',
    may: [...PURE, 'lib/server'],
    instead: 'Commands call lib/server; tables are reached through its queries and commands.',
  },
  { folder: 'models', may: [], instead: 'A model describes one table: rules over rows belong in lib/server.' },
  {
    folder: 'migrations',
    may: [],
    packages: ['sequelize'],
    instead: 'A migration must still run when our code has moved on: write out what it needs.',
  },
  {
    folder: 'workers',
    may: ['lib/offline', 'lib/comb', 'lib/brood', 'lib/stats'],
    instead: 'Workers run in the browser: use lib/offline and the pure folders.',
  },
];

/** Folders from which neither models nor lib/server may be reached by any path, not even by a type. */
export const NEVER_REACH_SERVER = ['components', 'workers', 'lib/offline', 'app/(field)'];

/** Every top-level folder that holds code; imports of anything else are none of the table's business. */
export const CODE_FOLDERS = ['app', 'components', 'lib', 'models', 'migrations', 'workers', 'tests'];

/**
 * Files where the running program meets the clock, chance and the machine; everywhere else these are arguments.
 * Globs for the linter.
 */
export const EDGE_FILES = ['lib/kit/**', 'lib/cli/**', 'lib/**/*-edge.ts', 'workers/**', 'proxy.ts', 'tests/**'];

/**
 * The rule for a file or folder path, or undefined for files outside the table (settings, tests).
 *
 * @param {string} path from the root, with forward slashes
 */
export function ruleFor(path) {
  return IMPORT_TABLE.find(({ folder }) => path === folder || path.startsWith(`${folder}/`));
}

/**
 * May `from` import `to`? Both are paths from the root; `to` need not exist.
 *
 * @param {string} from
 * @param {string} to
 */
export function mayImport(from, to) {
  const rule = ruleFor(from);
  if (!rule || !CODE_FOLDERS.includes(to.split('/')[0])) return true;
  return [rule.folder, 'lib/kit', ...rule.may].some((folder) => to === folder || to.startsWith(`${folder}/`));
}
