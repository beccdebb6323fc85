import { type Json, canonicalJson } from './canonical-json';
import type { HashedPart } from './op';

/** SHA-256 of UTF-8 text as lower-case hex; the platform's implementation is handed in. */
export type Sha256 = (text: string) => Promise<string>;

/** The canonical text whose SHA-256 is an operation's `bodyHash`. */
export function hashedText({ kind, kindV, nest, visit, reading, at, deps, body }: HashedPart): string {
  const time: Json = { wall: at.wall, mono: at.mono, boot: at.boot, skewMs: at.skewMs };
  return canonicalJson({ kind, kindV, nest, visit, reading, at: time, deps, body });
}
