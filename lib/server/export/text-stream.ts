import 'server-only';
import { byteStream } from './byte-stream';

/** Characters gathered before they are handed on. */
const CHUNK = 32 * 1024;

/** UTF-8 of some texts, gathered into pieces worth handing on. */
export async function* encodedPieces(parts: AsyncGenerator<string>): AsyncGenerator<Uint8Array> {
  const encoder = new TextEncoder();
  let text = '';
  for await (const part of parts) {
    text += part;
    if (text.length < CHUNK) continue;
    yield encoder.encode(text);
    text = '';
  }
  if (text !== '') yield encoder.encode(text);
}

/**
 * A UTF-8 stream of texts that are only made when the reader asks for more.
 *
 * @param onEnd called once: after the last text, when making one failed, or when the reader went away.
 */
export function textStream(
  parts: AsyncGenerator<string>,
  onEnd: (error?: unknown) => Promise<void>,
): ReadableStream<Uint8Array> {
  return byteStream(encodedPieces(parts), onEnd);
}
