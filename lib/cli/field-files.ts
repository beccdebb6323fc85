import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { CommandError } from './command-error';

/** Names of built files as they stand in pages, scripts and styles. */
const BUILT_NAME = /static\/[\w./~[\]()@-]+?\.(?:js|css|woff2?|json|svg|png)(?![\w.])/g;
const TEXT_FILE = /\.(?:js|css|json|svg)$/;

/** Where Next leaves the page of the phone app when it is static. */
const FIELD_PAGE = join('server', 'app', 'field.html');

/**
 * The phone app's page as built.
 *
 * @throws CommandError when there is none: then the page is no longer static, and would not open without signal.
 */
export function fieldPage(buildDir: string): string {
  const path = join(buildDir, FIELD_PAGE);
  if (!existsSync(path))
    throw new CommandError('The page /field was not built ahead. It must stay static to open without signal.');
  return readFileSync(path, 'utf8');
}

function namesIn(text: string): string[] {
  return text.match(BUILT_NAME) ?? [];
}

/**
 * Every built file the phone app may ask for: those named in its page, and those named in these, and so on. (The
 * build's own manifest leaves out scripts that are loaded later.)
 *
 * @param buildDir the `.next` folder
 * @returns paths below it, such as `static/chunks/abc.js`, sorted.
 */
export function fieldFiles(buildDir: string): string[] {
  const found = new Set<string>();
  const toRead = namesIn(fieldPage(buildDir));
  for (let name = toRead.pop(); name !== undefined; name = toRead.pop()) {
    const path = join(buildDir, name);
    if (found.has(name) || !existsSync(path)) continue;
    found.add(name);
    if (TEXT_FILE.test(name)) toRead.push(...stylesNeighbours(name, readFileSync(path, 'utf8')));
  }
  return [...found].sort();
}

/** Names in a text, plus what a style sheet names beside itself (`url(../media/x.woff2)`). */
function stylesNeighbours(name: string, text: string): string[] {
  const names = namesIn(text);
  if (!name.endsWith('.css')) return names;
  const base = new URL(name, 'file:///');
  for (const [, quoted = ''] of text.matchAll(/url\(["']?([^"')]+)["']?\)/g)) {
    if (!quoted.startsWith('data:')) names.push(new URL(quoted, base).pathname.replace(/^\/(?:_next\/)?/, ''));
  }
  return names;
}
