import { isUuidText } from '@/lib/kit/uuid';

/** A screen of the field app and the entity it shows; ids are lower-case UUID text. */
export type FieldRoute =
  | { kind: 'nests' }
  | { kind: 'new-nest' }
  | { kind: 'nest'; id: string }
  | { kind: 'new-visit'; id: string }
  | { kind: 'visit'; id: string }
  | { kind: 'reading'; id: string }
  | { kind: 'unsent' }
  | { kind: 'bring-in' }
  | { kind: 'sheet'; id: string }
  | { kind: 'blank-sheet' }
  | { kind: 'typed'; id: string }
  | { kind: 'settings' }
  | { kind: 'unknown' };

/** Where the field app begins; every path of its own starts with it. */
export const FIELD_ROOT = '/field';

/** A map, because a path may spell a name that every object has. */
const FIXED: ReadonlyMap<string, FieldRoute> = new Map([
  ['', { kind: 'nests' }],
  ['nests', { kind: 'nests' }],
  ['nests/new', { kind: 'new-nest' }],
  ['unsent', { kind: 'unsent' }],
  ['unsent/bring-in', { kind: 'bring-in' }],
  ['sheet', { kind: 'blank-sheet' }],
  ['settings', { kind: 'settings' }],
]);

/** The part of a path after `/field/`, or null when it belongs to another part of the product. */
function innerPath(path: string): string | null {
  const trimmed = path.replace(/\/+$/, '');
  if (trimmed === FIELD_ROOT) return '';
  return trimmed.startsWith(`${FIELD_ROOT}/`) ? trimmed.slice(FIELD_ROOT.length + 1) : null;
}

/** The screen of a path with an id in it. */
function entityRoute(parts: readonly string[]): FieldRoute {
  const [folder, id, ...rest] = parts;
  if (!isUuidText(id)) return { kind: 'unknown' };
  const tail = rest.join('/');
  if (folder === 'nests' && tail === 'visits/new') return { kind: 'new-visit', id };
  if (folder === 'nests' && tail === 'sheet') return { kind: 'sheet', id };
  if (folder === 'visits' && tail === 'typed') return { kind: 'typed', id };
  if (tail !== '') return { kind: 'unknown' };
  if (folder === 'nests') return { kind: 'nest', id };
  if (folder === 'visits') return { kind: 'visit', id };
  if (folder === 'readings') return { kind: 'reading', id };
  return { kind: 'unknown' };
}

/**
 * Reads a path such as `/field/readings/<id>`. Ids are not looked up here: whether the phone holds the entity is for
 * the screen to say.
 */
export function parseFieldPath(path: string): FieldRoute {
  const inner = innerPath(path);
  if (inner === null) return { kind: 'unknown' };
  return FIXED.get(inner) ?? entityRoute(inner.split('/'));
}

/** The path of a screen; the inverse of `parseFieldPath`. The unknown screen leads home. */
export function fieldHref(route: FieldRoute): string {
  const inner: Record<FieldRoute['kind'], (id: string) => string> = {
    nests: () => '',
    'new-nest': () => '/nests/new',
    nest: (id) => `/nests/${id}`,
    'new-visit': (id) => `/nests/${id}/visits/new`,
    visit: (id) => `/visits/${id}`,
    reading: (id) => `/readings/${id}`,
    unsent: () => '/unsent',
    'bring-in': () => '/unsent/bring-in',
    sheet: (id) => `/nests/${id}/sheet`,
    'blank-sheet': () => '/sheet',
    typed: (id) => `/visits/${id}/typed`,
    settings: () => '/settings',
    unknown: () => '',
  };
  return FIELD_ROOT + inner[route.kind]('id' in route ? route.id : '');
}
