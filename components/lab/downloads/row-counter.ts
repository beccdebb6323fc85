const QUOTE = 0x22;
const LINE_FEED = 0x0a;

/** Counts the lines of a CSV file as its bytes arrive; line breaks inside quotes don't count. */
export interface RowCounter {
  /** Takes the next bytes and gives the lines so far, the header included. */
  take(bytes: Uint8Array): number;
}

/** A counter at the start of a file. */
export function rowCounter(): RowCounter {
  let lines = 0;
  let isQuoted = false;
  return {
    take(bytes) {
      for (const byte of bytes) {
        if (byte === QUOTE) isQuoted = !isQuoted;
        else if (byte === LINE_FEED && !isQuoted) lines += 1;
      }
      return lines;
    },
  };
}
