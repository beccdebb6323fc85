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
 * @param onEnd called once: after the last text, when making one failed, or when the reader went away.
 */
export function textStream(
  parts: AsyncGenerator<string>,
  onEnd: (error?: unknown) => Promise<void>,
): ReadableStream<Uint8Array> {
  const encoder = new TextEncoder();
  let isOver = false;
  const end = async (error?: unknown) => {
    if (isOver) return;
    isOver = true;
    await onEnd(error);
  };
  return new ReadableStream({
    async pull(controller) {
      try {
        const { text, done } = await gather(parts);
        // The reader may have gone away meanwhile; then nothing can be handed on any more.
        if (isOver) return;
        if (text !== '') controller.enqueue(encoder.encode(text));
        if (!done) return;
        await end();
        controller.close();
      } catch (error) {
        await end(error);
        throw error;
      }
    },
    async cancel() {
      isOver = true;
      // Waits for the part that is being made, so that nothing is read on a connection that was given back.
      await parts.return(undefined);
      await onEnd();
    },
  });
}
