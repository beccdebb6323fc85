import 'server-only';

/** Characters gathered before they are handed on. */
const CHUNK = 32 * 1024;

/** Takes parts until there is enough to hand on; blank only at the very end. */
async function gather(parts: AsyncIterator<string>): Promise<{ text: string; done: boolean }> {
  let text = '';
  while (text.length < CHUNK) {
    const { done, value } = await parts.next();
    if (done) return { text, done: true };
    text += value;
  }
  return { text, done: false };
}

/**
 * A UTF-8 stream of texts that are only made when the reader asks for more.
 *
 * @param onEnd called once the last text was handed on, making one failed, or the reader went away.
 */
export function textStream(parts: AsyncGenerator<string>, onEnd: (error?: unknown) => Promise<void>): ReadableStream<Uint8Array> {
  const encoder = new TextEncoder();
  return new ReadableStream({
    async pull(controller) {
      try {
        const { text, done } = await gather(parts);
        if (text !== '') controller.enqueue(encoder.encode(text));
        if (!done) return;
        await onEnd();
        controller.close();
      } catch (error) {
        await onEnd(error);
        throw error;
      }
    },
    async cancel() {
      await parts.return(undefined);
      await onEnd();
    },
  });
}
