import { isUuidText } from '@/lib/kit/uuid';
import { MAX_DEPS } from './limits';
import type { OpCode } from './op-codes';

/** Checks the dependencies of one operation: few, well-formed, and not itself. */
export function checkDeps(opId: string, deps: readonly unknown[]): OpCode | null {
  if (deps.length > MAX_DEPS) return 'deps';
  return deps.every((dep) => isUuidText(dep) && dep !== opId) ? null : 'deps';
}

/** Does an operation wait for itself, directly or through others, so that it could never be applied? */
function waitsForItself(opId: string, waitsFor: ReadonlyMap<string, readonly string[]>): boolean {
  const seen = new Set<string>();
  const ahead = [...(waitsFor.get(opId) ?? [])];
  for (let next = ahead.pop(); next !== undefined; next = ahead.pop()) {
    if (next === opId) return true;
    if (seen.has(next)) continue;
    seen.add(next);
    ahead.push(...(waitsFor.get(next) ?? []));
  }
  return false;
}

/**
 * Those of the given operations that wait for themselves.
 *
 * @param waitsFor what each operation waits for, those already parked on the server included.
 */
export function opsInCycles(opIds: readonly string[], waitsFor: ReadonlyMap<string, readonly string[]>): Set<string> {
  return new Set(opIds.filter((opId) => waitsForItself(opId, waitsFor)));
}
