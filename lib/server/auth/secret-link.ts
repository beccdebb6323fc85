import 'server-only';
import { createHash, randomBytes } from 'node:crypto';

/** Bytes of the secret in a link: 256 bit, so that guessing one is out of the question. */
const SECRET_BYTES = 32;

/** 32 bytes as base64url. */
const TOKEN = /^[A-Za-z0-9_-]{43}$/;

/** The secret of a link, and what is stored of it. */
export interface SecretLink {
  /** Goes into the letter and nowhere else. */
  token: string;
  hash: Buffer;
}

/** What is stored of a token; null for text that can be none. */
export function tokenHash(token: string): Buffer | null {
  return TOKEN.test(token) ? createHash('sha256').update(token, 'ascii').digest() : null;
}

/** A fresh secret for a link that works once. */
export function newSecretLink(): SecretLink {
  const token = randomBytes(SECRET_BYTES).toString('base64url');
  return { token, hash: createHash('sha256').update(token, 'ascii').digest() };
}
