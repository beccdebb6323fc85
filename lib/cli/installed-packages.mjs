import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';

/**
 * Does `node_modules` hold what the lock file asks for? npm writes its own record of what it installed at the very
 * end, so an interrupted installation has none. Packages for other machines are marked optional and may be missing.
 *
 * @param {string} root the project's folder
 * @returns {string | null} what is wrong, in words, or null
 */
export function packagesOutdated(root) {
  const record = join(root, 'node_modules', '.package-lock.json');
  if (!existsSync(record)) return 'packages are not installed yet';
  const wanted = JSON.parse(readFileSync(join(root, 'package-lock.json'), 'utf8')).packages;
  const present = JSON.parse(readFileSync(record, 'utf8')).packages;
  for (const [path, entry] of Object.entries(wanted)) {
    if (path === '' || entry.optional || entry.devOptional || entry.peer) continue;
    if (present[path]?.version !== entry.version)
      return `${path.replace('node_modules/', '')} should be ${entry.version}`;
  }
  return null;
}
