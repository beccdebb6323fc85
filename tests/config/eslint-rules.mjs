import { dirname, join, normalize, relative } from 'node:path';
import { mayImport, ruleFor } from './import-table.mjs';

/** The path from the root, with forward slashes. */
function fromRoot(context, path) {
  return relative(context.cwd, path).replaceAll('\\', '/');
}

/** What an import names, as a path from the root; null for packages. */
function importedPath(file, source) {
  if (source.startsWith('@/')) return source.slice(2);
  if (source.startsWith('.')) return normalize(join(dirname(file), source)).replaceAll('\\', '/');
  return null;
}

function packageName(source) {
  return source
    .split('/')
    .slice(0, source.startsWith('@') ? 2 : 1)
    .join('/');
}

/** Is this npm package, or module of Node, one that the folder may use? */
function mayUsePackage(rule, source) {
  return !rule?.packages || rule.packages.includes(packageName(source));
}

/** Calls `check(node, source)` for every import, type import, re-export and dynamic import with a fixed name. */
function onImports(check) {
  const visit = (node) => {
    if (typeof node.source?.value === 'string') check(node.source, node.source.value);
  };
  return {
    ImportDeclaration: visit,
    ExportNamedDeclaration: visit,
    ExportAllDeclaration: visit,
    ImportExpression: visit,
    TSImportType: (node) => check(node, node.source?.value ?? node.argument?.literal?.value ?? ''),
  };
}

const boundaries = {
  meta: {
    type: 'problem',
    schema: [],
    messages: {
      folder: '{{ from }} may not import {{ to }}. {{ instead }}',
      package: '{{ from }} may not use the package {{ to }}. {{ instead }}',
    },
  },
  create(context) {
    const file = fromRoot(context, context.filename);
    const rule = ruleFor(file);
    if (!rule) return {};
    const report = (node, messageId, to) =>
      context.report({ node, messageId, data: { from: rule.folder, to, instead: rule.instead } });
    return onImports((node, source) => {
      const path = importedPath(file, source);
      if (path !== null && !mayImport(file, path)) report(node, 'folder', path);
      if (path === null && !mayUsePackage(rule, source)) report(node, 'package', source);
    });
  },
};

const serverOnlyFirst = {
  meta: {
    type: 'problem',
    schema: [],
    messages: { first: "Begin with import 'server-only'; so that the build fails when this file reaches a browser." },
  },
  create(context) {
    return {
      Program(node) {
        const [first] = node.body;
        const marked = first?.type === 'ImportDeclaration' && first.source.value === 'server-only';
        if (!marked) context.report({ node: first ?? node, messageId: 'first' });
      },
    };
  },
};

const documentedExports = {
  meta: {
    type: 'suggestion',
    schema: [],
    messages: { missing: 'Say above {{ name }} what it is for, its units and its errors, in a /** */ block.' },
  },
  create(context) {
    const check = (node) => {
      const declaration = node.declaration;
      if (!/^(TSDeclareFunction|FunctionDeclaration|ClassDeclaration)$/.test(declaration?.type ?? '')) return;
      const before = context.sourceCode.getCommentsBefore(node).at(-1);
      if (before?.type === 'Block' && before.value.startsWith('*')) return;
      context.report({ node, messageId: 'missing', data: { name: declaration.id?.name ?? 'this' } });
    };
    return { ExportNamedDeclaration: check };
  },
};

/** Our own lint rules, as a plugin. */
export const ourRules = {
  rules: {
    boundaries,
    'server-only-first': serverOnlyFirst,
    'documented-exports': documentedExports,
  },
};
