import { CODE_FOLDERS, IMPORT_TABLE, NEVER_REACH_SERVER } from './import-table.mjs';

const escaped = (path) => path.replaceAll(/[()[\].]/g, String.raw`\$&`);
const anyOf = (paths) => `^(${paths.map(escaped).join('|')})(/|$)`;
const OUTSIDE_FOLDERS = ['npm', 'npm-dev', 'npm-optional', 'npm-peer', 'core'];

/** Folders of the table inside this one, whose files have a rule of their own. */
function nestedFolders(folder) {
  return IMPORT_TABLE.map((rule) => rule.folder).filter((other) => other.startsWith(`${folder}/`));
}

function filesOf(folder) {
  const nested = nestedFolders(folder);
  return nested.length > 0 ? { path: anyOf([folder]), pathNot: anyOf(nested) } : { path: anyOf([folder]) };
}

function folderRule({ folder, may, instead }) {
  return {
    name: `imports of ${folder}`,
    comment: instead,
    severity: 'error',
    from: filesOf(folder),
    to: { path: anyOf(CODE_FOLDERS), pathNot: anyOf([folder, 'lib/kit', ...may]) },
  };
}

function packageRule({ folder, packages, instead }) {
  const allowed = packages.map((name) => `(^|/)node_modules/${name}/`).join('|');
  return {
    name: `packages of ${folder}`,
    comment: instead,
    severity: 'error',
    from: { path: anyOf([folder]) },
    to: { dependencyTypes: OUTSIDE_FOLDERS, ...(allowed ? { pathNot: allowed } : {}) },
  };
}

/** What the linter cannot see: a way to the server through any number of files, by types too. */
function reachRule(folder) {
  return {
    name: `reach of ${folder}`,
    comment:
      'Somewhere along this way a file that runs on phones imports one that belongs to the server: cut it there.',
    severity: 'error',
    from: { path: anyOf([folder]) },
    to: { path: anyOf(['lib/server', 'models']), reachable: true },
  };
}

/** Settings of dependency-cruiser, made from the same table as the lint rule. */
const config = {
  forbidden: [
    ...IMPORT_TABLE.map(folderRule),
    ...IMPORT_TABLE.filter(({ packages }) => packages).map(packageRule),
    ...NEVER_REACH_SERVER.map(reachRule),
    {
      name: 'models',
      comment: 'Only lib/server and tests know the models: ask a function of lib/server.',
      severity: 'error',
      from: { pathNot: anyOf(['lib/server', 'models', 'tests']) },
      to: { path: anyOf(['models']) },
    },
    {
      name: 'cycle',
      comment:
        'Files that import each other in a ring can only be understood together: move what both need to a third.',
      severity: 'error',
      from: {},
      to: { circular: true },
    },
    {
      name: 'tests',
      comment: 'What runs in production does not know its tests.',
      severity: 'error',
      from: { pathNot: '^tests/' },
      to: { path: '^tests/' },
    },
    {
      name: 'unresolved',
      comment: 'This import names nothing that exists.',
      severity: 'error',
      from: {},
      to: { couldNotResolve: true, pathNot: '^server-only$' },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: String.raw`^(\.next|\.data|public)` },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'require', 'node', 'default', 'types'],
    },
  },
};

export default config;
