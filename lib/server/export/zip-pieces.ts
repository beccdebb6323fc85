import 'server-only';
import { Readable } from 'node:stream';
import { ZipFile } from 'yazl';
import type { ExportCall, ExportLines } from './export-call';
import { encodedPieces } from './text-stream';

/** Stops reading a file and waits until its last query is done. */
async function finish(file: Readable | undefined): Promise<void> {
  if (!file || file.closed) return;
  const closed = new Promise<void>((resolve) => file.once('close', () => resolve()));
  file.destroy();
  await closed;
}

/**
 * Several files as one ZIP archive that is made while it is read: a file is begun when the one before it has left, so
 * that memory and the one database connection are enough for any size.
 *
 * @param files lines by file name, in the order they stand in the archive.
 * @param modifiedMs the time the files carry, epoch milliseconds.
 */
export async function* zipPieces(
  files: ReadonlyMap<string, ExportLines>,
  call: ExportCall,
  modifiedMs: number,
): AsyncGenerator<Uint8Array> {
  const zip = new ZipFile();
  const output = zip.outputStream as Readable;
  const begun: Readable[] = [];
  let isOver = false;
  zip.on('error', (error: Error) => output.destroy(error));
  for (const [name, lines] of files) {
    zip.addReadStreamLazy(name, { mtime: new Date(modifiedMs) }, (begin) => {
      // Once the reader has gone away the archive still asks for the next file; its queries must not be begun.
      const file = Readable.from(isOver ? [] : encodedPieces(lines(call)), { objectMode: false });
      begun.push(file);
      begin(null, file);
    });
  }
  zip.end();
  try {
    for await (const piece of output) yield piece as Buffer;
  } finally {
    isOver = true;
    await finish(begun.at(-1));
  }
}
