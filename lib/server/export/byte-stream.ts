import 'server-only';

/**
 * A stream of bytes that are only made when the reader asks for more.
 *
 * @param onEnd called once: after the last piece, when making one failed, or when the reader went away.
 */
export function byteStream(
  pieces: AsyncGenerator<Uint8Array>,
  onEnd: (error?: unknown) => Promise<void>,
): ReadableStream<Uint8Array> {
  let isOver = false;
  const end = async (error?: unknown) => {
    if (isOver) return;
    isOver = true;
    await onEnd(error);
  };
  return new ReadableStream({
    async pull(controller) {
      try {
        const { done, value } = await pieces.next();
        // The reader may have gone away meanwhile; then nothing can be handed on any more.
        if (isOver) return;
        if (!done) {
          controller.enqueue(value);
          return;
        }
        await end();
        controller.close();
      } catch (error) {
        await end(error);
        throw error;
      }
    },
    async cancel() {
      isOver = true;
      // Waits for the piece that is being made, so that nothing is read on a connection that was given back.
      await pieces.return(undefined);
      await onEnd();
    },
  });
}
