import 'server-only';
import { MAX_BODY_BYTES } from '@/lib/protocol/limits';
import { type StrictJson, parseStrictJson } from '@/lib/protocol/strict-json';
import { HttpProblem } from './problem';
import { readBody } from './read-body';

const JSON_TYPE = /^application\/json\s*(;\s*charset\s*=\s*"?utf-8"?\s*)?$/i;

/** Is the body declared as plain JSON in UTF-8? */
function isPlainJson(headers: Headers): boolean {
  const encoding = headers.get('content-encoding');
  if (encoding !== null && encoding.toLowerCase() !== 'identity') return false;
  return JSON_TYPE.test(headers.get('content-type') ?? '');
}

/**
 * The JSON object of a request body, read strictly.
 *
 * @throws HttpProblem `content-type`, `body`, `empty`, `json`, `dup-key`, or `shape` for anything but an object.
 */
export async function readJson(request: Request, maxBytes = MAX_BODY_BYTES): Promise<StrictJson> {
  if (!isPlainJson(request.headers)) throw new HttpProblem('content-type');
  const text = await readBody(request, maxBytes);
  if (text.trim() === '') throw new HttpProblem('empty');
  const parsed = parseStrictJson(text);
  if (!parsed.ok) throw new HttpProblem(parsed.error);
  const { value } = parsed.value;
  if (value === null || typeof value !== 'object' || Array.isArray(value)) throw new HttpProblem('shape');
  return parsed.value;
}
