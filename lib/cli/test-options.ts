import { CommandError } from './command-error';

/** The parts of `npm test`, in the order they run. */
export const TEST_PARTS = ['check', 'unit', 'property', 'build', 'db', 'api', 'e2e'] as const;

/** One part of `npm test`. */
export type TestPart = (typeof TEST_PARTS)[number];

function isPart(name: string): name is TestPart {
  return TEST_PARTS.some((part) => part === name);
}

/**
 * Reads the arguments of `npm test -- ...`.
 *
 * @returns the parts to run: all, or those of `--only=unit,e2e`.
 * @throws CommandError on anything else.
 */
export function readTestOptions(args: readonly string[]): Set<TestPart> {
  const usage = `usage: npm test -- [--only=${TEST_PARTS.join(',')}]`;
  const [first, ...more] = args;
  if (first === undefined) return new Set(TEST_PARTS);
  if (more.length > 0 || !first.startsWith('--only=')) throw new CommandError(usage);
  const names = first.slice('--only='.length).split(',');
  const known = names.filter(isPart);
  if (known.length !== names.length) throw new CommandError(usage);
  return new Set(known);
}
