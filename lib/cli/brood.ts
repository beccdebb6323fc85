import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { answerHistories } from '@/lib/brood/answer-histories';
import { estimateNest } from '@/lib/brood/estimate-nest';
import { parseHistoriesFile } from '@/lib/brood/histories-file';
import { parseNestFile } from '@/lib/brood/nest-file';
import { type Result, err, ok } from '@/lib/kit/result';

const USAGE = 'usage: npm run --silent brood -- --nest FILE.json | --histories FILE.json';

/** The exit code of a file or a command line that cannot be read. */
const EXIT_MALFORMED = 2;

function sha256(text: string): string {
  return createHash('sha256').update(text).digest('hex');
}

function nestAnswer(text: string): Result<unknown, string> {
  const input = parseNestFile(text);
  return input.ok ? ok(estimateNest({ ...input.value, digest: sha256 })) : input;
}

function historiesAnswer(text: string): Result<unknown, string> {
  const file = parseHistoriesFile(text);
  return file.ok ? ok(answerHistories(file.value)) : file;
}

const DOORS: Readonly<Record<string, (text: string) => Result<unknown, string>>> = {
  '--nest': nestAnswer,
  '--histories': historiesAnswer,
};

function readInput(path: string): Result<string, string> {
  try {
    return ok(readFileSync(path, 'utf8'));
  } catch {
    return err(`cannot read the file ${path}`);
  }
}

/** Reads the file the arguments name and answers it, or says in one line what is wrong. */
function answer([door = '', path, ...rest]: readonly string[]): Result<unknown, string> {
  const run = Object.hasOwn(DOORS, door) ? DOORS[door] : undefined;
  if (!run || path === undefined || rest.length > 0) return err(USAGE);
  const text = readInput(path);
  return text.ok ? run(text.value) : text;
}

const result = answer(process.argv.slice(2));
if (result.ok) {
  process.stdout.write(`${JSON.stringify(result.value, null, 2)}\n`);
} else {
  // Names and texts of the file are repeated in the message; it stays one line.
  process.stderr.write(`${result.error.replace(/\s+/g, ' ')}\n`);
  process.exitCode = EXIT_MALFORMED;
}
