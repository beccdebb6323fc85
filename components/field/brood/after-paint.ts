/**
 * Does something once the screen has been drawn, so that the work of drawing and what follows do not fall together.
 *
 * @returns takes it back, if it has not been done yet.
 */
export function afterPaint(act: () => void): () => void {
  let timer: ReturnType<typeof setTimeout> | undefined;
  const frame = requestAnimationFrame(() => {
    timer = setTimeout(act);
  });
  return () => {
    cancelAnimationFrame(frame);
    clearTimeout(timer);
  };
}
