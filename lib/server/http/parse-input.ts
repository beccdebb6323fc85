import 'server-only';
import type { z } from 'zod';
import type { Json } from '@/lib/protocol/canonical-json';
import { HttpProblem } from './problem';

/**
 * Checks a body against its schema, which names every member (`z.strictObject`).
 *
 * @throws HttpProblem `unknown-field` for a member the schema does not name, `shape` for anything else.
 */
export function parseInput<Schema extends z.ZodType>(schema: Schema, value: Json): z.output<Schema> {
  const parsed = schema.safeParse(value);
  if (parsed.success) return parsed.data;
  const unknown = parsed.error.issues.some((issue) => issue.code === 'unrecognized_keys');
  throw new HttpProblem(unknown ? 'unknown-field' : 'shape');
}
