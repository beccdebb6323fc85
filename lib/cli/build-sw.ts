import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, readdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { build } from 'esbuild';
import { injectManifest } from 'workbox-build';
import { CommandError } from './command-error';
import { fieldFiles, fieldPage } from './field-files';
import { inlineScriptHashes } from './inline-script-hashes';

/** A file to keep on the phone; built files carry their version in their name and need no revision. */
interface KeptFile {
  url: string;
  revision: string | null;
}

const NOT_FOUND_PAGE = join('server', 'app', '_not-found.html');
const MANIFEST = join('server', 'app', 'manifest.webmanifest.body');
/** Estimates brood in the phone. It lies below /field, because only there the service worker answers for it offline. */
const BROOD_WORKER = 'field/brood-worker.js';
const TOO_LARGE = 4 * 1024 * 1024;

function revisionOf(path: string): string {
  return createHash('sha256').update(readFileSync(path)).digest('hex').slice(0, 20);
}

function iconFiles(root: string): KeptFile[] {
  const folder = join(root, 'public', 'icons');
  return readdirSync(folder)
    .sort()
    .map((name) => ({ url: `/icons/${name}`, revision: revisionOf(join(folder, name)) }));
}

/** The files beside the built ones: the page itself, the app manifest, the icons. */
function furtherFiles(root: string, buildDir: string): KeptFile[] {
  const field = createHash('sha256').update(fieldPage(buildDir)).digest('hex').slice(0, 20);
  const manifest = join(buildDir, MANIFEST);
  return [
    { url: '/field', revision: field },
    ...(existsSync(manifest) ? [{ url: '/manifest.webmanifest', revision: revisionOf(manifest) }] : []),
    { url: `/${BROOD_WORKER}`, revision: revisionOf(join(root, 'public', BROOD_WORKER)) },
    ...iconFiles(root),
  ];
}

async function bundleWorker(root: string, source: string, outfile: string): Promise<void> {
  await build({
    entryPoints: [join(root, 'workers', source)],
    outfile,
    bundle: true,
    format: 'iife',
    minify: true,
    target: 'es2020',
    tsconfig: join(root, 'workers', 'tsconfig.json'),
    define: { 'process.env.NODE_ENV': '"production"' },
  });
}

/** Writes the hashes of inline scripts of the pages built ahead, which `proxy.ts` puts into their policy. */
function writeScriptHashes(buildDir: string): void {
  const notFound = join(buildDir, NOT_FOUND_PAGE);
  const pages = [fieldPage(buildDir), ...(existsSync(notFound) ? [readFileSync(notFound, 'utf8')] : [])];
  writeFileSync(join(buildDir, 'field-csp.json'), JSON.stringify([...new Set(pages.flatMap(inlineScriptHashes))]));
}

/**
 * Makes `public/field/brood-worker.js` and, from a finished `next build`, `public/sw.js`: our own worker, bundled, with the
 * list of every file the phone app needs; a phone stores either all of them or keeps the version before.
 *
 * @param root the project's folder
 * @throws CommandError when the phone app's page was not built ahead, or a file was too large to keep.
 */
export async function buildServiceWorker(root: string): Promise<void> {
  const buildDir = join(root, '.next');
  const files = fieldFiles(buildDir);
  const bundle = join(buildDir, 'service-worker', 'sw.js');
  mkdirSync(join(buildDir, 'service-worker'), { recursive: true });
  await bundleWorker(root, 'sw.ts', bundle);
  await bundleWorker(root, 'brood.ts', join(root, 'public', BROOD_WORKER));
  const { count, warnings } = await injectManifest({
    swSrc: bundle,
    swDest: join(root, 'public', 'sw.js'),
    globDirectory: buildDir,
    globPatterns: files.map((name) => name.replace(/[[\]()]/g, '\\$&')),
    modifyURLPrefix: { 'static/': '/_next/static/' },
    dontCacheBustURLsMatching: /^\/_next\/static\//,
    maximumFileSizeToCacheInBytes: TOO_LARGE,
    additionalManifestEntries: furtherFiles(root, buildDir),
  });
  if (warnings.length > 0) throw new CommandError(`The service worker is incomplete: ${warnings.join('; ')}`);
  if (count <= files.length) throw new CommandError(`The service worker lists ${count} files, fewer than it should.`);
  writeScriptHashes(buildDir);
}
