import type { OpCode } from './op-codes';
import { parseWall } from './wall-time';

/** Checks the wall time of an operation: `time` when there is no such date or time, `tz` for no such offset or zone. */
export function checkTime(wall: string): OpCode | null {
  const parsed = parseWall(wall);
  return parsed.ok ? null : parsed.error;
}
