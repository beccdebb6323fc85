import { inflateRawSync } from 'node:zlib';

const END = 0x06054b50;
const ENTRY = 0x02014b50;
const DEFLATED = 8;

function contentAt(bytes: Buffer, at: { local: number; size: number; method: number }): string {
  const start = at.local + 30 + bytes.readUInt16LE(at.local + 26) + bytes.readUInt16LE(at.local + 28);
  const packed = bytes.subarray(start, start + at.size);
  return (at.method === DEFLATED ? inflateRawSync(packed) : packed).toString('utf8');
}

/**
 * The files of a small ZIP archive by name, in its order, read from the directory at its end.
 *
 * @throws when the bytes are no archive.
 */
export function readZip(bytes: Buffer): Map<string, string> {
  const end = bytes.length - 22;
  if (end < 0 || bytes.readUInt32LE(end) !== END) throw new Error('no end of a central directory');
  const files = new Map<string, string>();
  let at = bytes.readUInt32LE(end + 16);
  for (let left = bytes.readUInt16LE(end + 10); left > 0; left -= 1) {
    if (bytes.readUInt32LE(at) !== ENTRY) throw new Error('no entry where one should be');
    const nameLength = bytes.readUInt16LE(at + 28);
    const name = bytes.subarray(at + 46, at + 46 + nameLength).toString('utf8');
    const place = {
      local: bytes.readUInt32LE(at + 42),
      size: bytes.readUInt32LE(at + 20),
      method: bytes.readUInt16LE(at + 10),
    };
    files.set(name, contentAt(bytes, place));
    at += 46 + nameLength + bytes.readUInt16LE(at + 30) + bytes.readUInt16LE(at + 32);
  }
  return files;
}
