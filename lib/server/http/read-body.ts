import 'server-only';
import { HttpProblem } from './problem';

/** A declared length above the limit is refused before a byte is read. */
function declaredTooLong(request: Request, maxBytes: number): boolean {
  const declared = request.headers.get('content-length');
  return declared !== null && Number(declared) > maxBytes;
}

/** The rest of a refused body is not read: the connection is closed. */
function tooLarge(): HttpProblem {
  return new HttpProblem('body', { headers: { Connection: 'close' } });
}

/** The bytes of a body, read no further than the limit. */
async function readBytes(body: ReadableStream<Uint8Array>, maxBytes: number): Promise<Uint8Array> {
  const chunks: Uint8Array[] = [];
  let length = 0;
  const reader = body.getReader();
  for (;;) {
    const { done, value } = await reader.read();
    if (done) return Buffer.concat(chunks, length);
    length += value.length;
    if (length > maxBytes) {
      await reader.cancel().catch(() => undefined);
      throw tooLarge();
    }
    chunks.push(value);
  }
}

/**
 * The text of a request body.
 *
 * @param maxBytes where reading stops.
 * @throws HttpProblem `body` above the limit, `json` for bytes that are not UTF-8.
 */
export async function readBody(request: Request, maxBytes: number): Promise<string> {
  if (declaredTooLong(request, maxBytes)) throw tooLarge();
  if (!request.body) return '';
  const bytes = await readBytes(request.body, maxBytes);
  try {
    return new TextDecoder('utf-8', { fatal: true, ignoreBOM: true }).decode(bytes);
  } catch {
    throw new HttpProblem('json');
  }
}
