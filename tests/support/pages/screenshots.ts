import { join } from 'node:path';

/** Where the pictures of a test run go; the folder is ignored by git. */
export function screenshotPath(name: string): string {
  return join('.artifacts', 'screens', `${name}.png`);
}
