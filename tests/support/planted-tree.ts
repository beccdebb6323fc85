import { execFile } from 'node:child_process';
import { cpSync, mkdirSync, mkdtempSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';

/** A small project made for one test: our settings around files that the test wrote. */
export interface PlantedTree {
  folder: string;
  /** Runs a program of `node_modules` in it; resolves with everything it printed and its exit code. */
  run(script: string, args: readonly string[]): Promise<{ code: number; output: string }>;
  remove(): void;
}

const SETTINGS = ['package.json', 'tsconfig.json', 'workers/tsconfig.json', 'tests/config'];

/** Makes the project in the system's temporary folder. Keys of `files` are paths from its root. */
export function plantTree(files: Readonly<Record<string, string>>): PlantedTree {
  const folder = mkdtempSync(join(tmpdir(), 'undereave-planted-'));
  for (const path of SETTINGS) cpSync(path, join(folder, path), { recursive: true });
  symlinkSync(join(process.cwd(), 'node_modules'), join(folder, 'node_modules'));
  for (const [path, text] of Object.entries(files)) {
    mkdirSync(dirname(join(folder, path)), { recursive: true });
    writeFileSync(join(folder, path), text);
  }
  const run = (script: string, args: readonly string[]) =>
    new Promise<{ code: number; output: string }>((resolve) => {
      const child = execFile(
        process.execPath,
        [join('node_modules', script), ...args],
        { cwd: folder },
        (_, out, err) => resolve({ code: child.exitCode ?? 1, output: out + err }),
      );
    });
  return { folder, run, remove: () => rmSync(folder, { recursive: true, force: true }) };
}
