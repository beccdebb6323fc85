import { isUuidText } from '@/lib/kit/uuid';
import { MAX_DEPS } from './limits';
import type { OpCode } from './op-codes';

/** Checks the dependencies of one operation: few, well-formed, and not itself. */
export function checkDeps(opId: string, deps: readonly unknown[]): OpCode | null {
  if (deps.length > MAX_DEPS) return 'deps';
  return deps.every((dep) => isUuidText(dep) && dep !== opId) ? null : 'deps';
}

/**
 * The operations that wait for themselves, directly or through others, and so could never be applied.
 *
 * @param waitsFor what each operation waits for, those already parked on the server included.
 */
export function opsInCycles(waitsFor: ReadonlyMap<string, readonly string[]>): Set<string> {
  const caught = new Set<string>();
  for (const start of waitsFor.keys()) {
    const seen = new Set<string>();
    const ahead = [...(waitsFor.get(start) ?? [])];
    for (let next = ahead.pop(); next !== undefined; next = ahead.pop()) {
      if (next === start) caught.add(start);
      if (seen.has(next)) continue;
      seen.add(next);
      ahead.push(...(waitsFor.get(next) ?? []));
    }
  }
  return caught;
}
